import { afterAll, beforeAll, expect, test } from 'vitest';
import { askForInventedFit, untilCompleted, untilRunning } from './invented-sample.ts';
import { endLaunchers, makeHome, processesOf, type RunningStack, startStack, workerPid } from './running-stack.ts';

let stack: RunningStack;
let remove: () => Promise<void>;
beforeAll(async () => {
  const made = await makeHome();
  remove = made.remove;
  stack = await startStack(made.home);
});
afterAll(async () => {
  await endLaunchers();
  await remove();
});

test('loses nothing and stores one result, the same as undisturbed, when its worker is killed in the middle of a fit', async () => {
  const id = await askForInventedFit(stack, 11);
  await untilRunning(stack, id);
  process.kill(await workerPid(stack), 'SIGKILL');
  const fit = await untilCompleted(stack, id);
  // One attempt was lost, so it was in the middle indeed.
  expect(fit.attempt).toBe(2);

  const { acquisitionId, methodId } = fit;
  const order = { acquisitionId, methodId, repeatReason: 'to compare with an undisturbed run' };
  const repeat = (await stack.post('pipeline', '/v1/fits', order)) as { id: string };
  expect(repeat.id).not.toBe(id);
  expect((await untilCompleted(stack, repeat.id)).attempt).toBe(1);
  const [disturbed, undisturbed] = [
    await stack.read('lims', `/v1/fits/${id}/result`),
    await stack.read('lims', `/v1/fits/${repeat.id}/result`),
  ];
  expect(disturbed).toBe(undisturbed);

  const page = JSON.parse(await stack.read('lims', '/v1/results?limit=100')) as { events: { fitId: string }[] };
  expect(page.events.map(({ fitId }) => fitId)).toEqual([id, repeat.id]);
});

test('starts a killed API again at the same address', async () => {
  const { home, process: launcher, access } = stack;
  const api = (await processesOf(home, launcher.pid)).find(({ command }) => command.includes('services/api'));
  process.kill(Number(api?.pid), 'SIGKILL');
  const isHealthy = async () => (await fetch(`${access.baseUrl}/healthz`).catch(() => undefined))?.status;
  await expect.poll(isHealthy, { timeout: 30_000 }).toBe(200);
});
