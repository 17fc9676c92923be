import { fork } from 'node:child_process';
import { open, readFile } from 'node:fs/promises';
import { setTimeout as pause } from 'node:timers/promises';

/** A service drains for 5 s and closes its connections; one that has not left by then is ended. */
const stopSecondsMax = 30;
const restartSecondsFirst = 1;
const restartSecondsMax = 30;
/** One that ran for so long was well: the next restart is quick again. */
const wellSeconds = 60;

/**
 * A service under the launcher: started, started again when it dies, stopped when asked to.
 *
 * Detached, so that a Ctrl-C at the terminal reaches the launcher alone, which stops one after the other. The IPC channel tells a service
 * that its launcher is gone.
 *
 * @param {{name: string, program: string, logFile: string, readyEvent: string, environment: () => object, say: (text: string) => void}} service
 */
export function createServiceProcess(service) {
  let child;
  let isStopping = false;

  const startOnce = async () => {
    const log = await open(service.logFile, 'a', 0o600);
    const stdio = ['ignore', log.fd, log.fd, 'ipc'];
    const started = fork(service.program, [], { detached: true, stdio, execArgv: [], env: service.environment() });
    await log.close();
    child = started;
    const exited = new Promise((resolve) => started.once('exit', (code, signal) => resolve(code ?? signal)));
    const ready = new Promise((resolve) => {
      started.on('message', (message) => message.event === service.readyEvent && resolve(message));
    });
    started.once('error', () => {}); // It never ran; `exit` does not come, the race below is decided by `ready` alone.
    return { started, exited, ready };
  };

  const keep = async (exited) => {
    let restartSeconds = restartSecondsFirst;
    for (let ended = exited; ; ) {
      const since = performance.now();
      const how = await ended;
      if (isStopping) return;
      if (performance.now() - since > wellSeconds * 1_000) restartSeconds = restartSecondsFirst;
      service.say(
        `the ${service.name} ended (${how}); starting it again in ${restartSeconds} s. Its log: ${service.logFile}`,
      );
      await pause(restartSeconds * 1_000);
      restartSeconds = Math.min(2 * restartSeconds, restartSecondsMax);
      if (isStopping) return;
      ({ exited: ended } = await startOnce());
    }
  };

  return {
    /** Start it and keep it running. @throws Error with the end of its log when it ends before it is ready */
    async start() {
      const { exited, ready } = await startOnce();
      const first = await Promise.race([ready, exited.then((how) => ({ how }))]);
      if ('how' in first) {
        const end = (await readFile(service.logFile, 'utf8')).trimEnd().split('\n').slice(-12).join('\n');
        throw new Error(`the ${service.name} did not start (${first.how}). End of ${service.logFile}:\n${end}`);
      }
      void keep(exited);
      return first;
    },
    async stop() {
      isStopping = true;
      if (child === undefined || child.exitCode !== null || child.signalCode !== null) return;
      const exited = new Promise((resolve) => child.once('exit', resolve));
      child.kill('SIGTERM');
      const isLate = await Promise.race([
        exited.then(() => false),
        pause(stopSecondsMax * 1_000, true, { ref: false }),
      ]);
      if (!isLate) return;
      service.say(`the ${service.name} did not stop within ${stopSecondsMax} s and is ended`);
      child.kill('SIGKILL');
      await exited;
    },
    /** End it at once. */
    kill() {
      isStopping = true;
      child?.kill('SIGKILL');
    },
  };
}
