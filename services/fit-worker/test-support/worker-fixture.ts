import { type CompoundBody, canonicalJson, sha256Hex } from '@spinassay/contract';
import { type Bell, createBell, migrateBell } from '@spinassay/job-queue';
import { createLogger } from '@spinassay/service-runtime';
import {
  createDocumentVersion,
  findFit,
  type NewFit,
  type NoticeBoard,
  openNoticeBoard,
  openStore,
  openWorkerSession,
  type Store,
  type StoredFit,
} from '@spinassay/store';
import { createTestDatabase, type SeededLaboratory, seedLaboratory } from '@spinassay/store/test-support';
import { afterAll, beforeAll } from 'vitest';
import { createFitWorker, type FitWorker } from '../src/create-fit-worker.ts';
import { createAnalysisThreads } from '../src/threads/analysis-threads.ts';
import { type MadeUpAct, madeUpRequest, madeUpThread } from './made-up-request.ts';

const source = 'made up for a test';
const tsp: CompoundBody = {
  name: 'TSP',
  molarMassGramsPerMole: 172.27,
  spinSystems: [
    {
      label: 'methyl',
      count: 1,
      groups: [{ label: 'CH3', shiftPpm: 0, shiftScale: 'TSP', spins: [{ label: 'H', protonCount: 9 }], source }],
      couplings: [],
    },
  ],
  sources: [source],
};

export type WorkerFixture = {
  readonly store: Store;
  readonly bell: Bell;
  readonly notices: NoticeBoard;
  readonly connectionString: string;
  /** Ask for a fit whose analysis does what the act says. Every call makes another fit. */
  askForFit(act: MadeUpAct): Promise<StoredFit>;
  readFit(id: string): Promise<StoredFit>;
  /** A worker with threads and a bell of its own; `end` drains it and closes these. */
  startWorker(options?: { concurrency?: number; label?: string }): {
    worker: FitWorker;
    end(): Promise<void>;
    logged(): string;
  };
  readonly laboratoryId: string;
};

/** A laboratory on a database of its own, with a method for every act. Registers its hooks; read the fields inside tests only. */
export function workerFixture(): WorkerFixture {
  let made: Omit<WorkerFixture, 'askForFit' | 'readFit' | 'startWorker'> | undefined;
  let laboratory: SeededLaboratory;
  let end: () => Promise<void> = async () => {};
  beforeAll(async () => {
    const database = await createTestDatabase();
    const { connectionString } = database;
    await migrateBell(connectionString);
    const onFault = () => {}; // Tests cut connections on purpose.
    const connection = { connectionString, applicationName: 'fit-worker-test' };
    const store = openStore({ ...connection, onConnectionFault: onFault });
    const bell = createBell({ ...connection, onFault });
    const notices = openNoticeBoard({ ...connection, onConnectionFault: onFault });
    laboratory = await seedLaboratory(store, 'made-up laboratory');
    made = { store, bell, notices, connectionString, laboratoryId: laboratory.laboratoryId };
    end = async () => {
      await Promise.all([bell.close(), notices.close()]);
      await store.close();
      await database.drop();
    };
  });
  afterAll(() => end());

  const there = () => {
    if (made === undefined) throw new Error('the fixture is there inside its tests only');
    return made;
  };
  let fitCount = 0;
  return {
    get store() {
      return there().store;
    },
    get bell() {
      return there().bell;
    },
    get notices() {
      return there().notices;
    },
    get connectionString() {
      return there().connectionString;
    },
    get laboratoryId() {
      return there().laboratoryId;
    },
    askForFit: async (act) => {
      const method = await keepMethod(there(), act);
      fitCount += 1;
      return laboratory.askForFit(`fit ${fitCount}`, method);
    },
    readFit: async (id) => {
      const { store, laboratoryId } = there();
      const fit = await store.withLaboratory(laboratoryId, (transaction) => findFit(transaction, id));
      if (fit === undefined) throw new Error(`there is no fit ${id}`);
      return fit;
    },
    startWorker: (options) => startWorker(there(), options),
  };
}

async function keepMethod(
  { store, laboratoryId }: Pick<WorkerFixture, 'store' | 'laboratoryId'>,
  act: MadeUpAct,
): Promise<Pick<NewFit, 'methodId' | 'methodVersion'>> {
  return store.withLaboratory(laboratoryId, async (transaction) => {
    const { method } = madeUpRequest(act);
    const pinned = { ...method, reference: { compoundId: 'tsp', compoundVersion: 1 } };
    const panel = method.panel.map((entry) => ({ ...entry, compoundVersion: 1 }));
    const keep = (kind: 'compound' | 'method', id: string, body: object) => {
      const bodyText = canonicalJson(body);
      return createDocumentVersion(transaction, { kind, id, name: id, bodyText, sha256: sha256Hex(bodyText) });
    };
    await keep('compound', 'tsp', tsp);
    const { document } = await keep('method', act.replaceAll(' ', '-'), { ...pinned, panel });
    return { methodId: document.id, methodVersion: document.version };
  });
}

function startWorker(
  { store, notices, connectionString }: Omit<WorkerFixture, 'askForFit' | 'readFit' | 'startWorker'>,
  { concurrency = 1, label = 'made-up worker' }: { concurrency?: number; label?: string } = {},
): ReturnType<WorkerFixture['startWorker']> {
  const lines: string[] = [];
  const bell = createBell({ connectionString, applicationName: label, onFault: () => {} });
  const threads = createAnalysisThreads({ entry: madeUpThread, readyCount: concurrency });
  const worker = createFitWorker({
    store,
    bell,
    notices,
    threads,
    logger: createLogger({ service: 'fit-worker', destination: { write: (line) => void lines.push(line) } }),
    identity: { engineVersion: 'made-up', numericsId: 'made-up' },
    concurrency,
    openSession: () =>
      openWorkerSession({ connectionString, applicationName: label }, { label, wantedConcurrency: concurrency }),
  });
  return {
    worker,
    logged: () => lines.join(''),
    end: async () => {
      await worker.drain(0);
      await Promise.all([threads.close(), bell.close()]);
    },
  };
}
