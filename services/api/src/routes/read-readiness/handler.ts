import type { Readiness } from '@spinassay/contract';
import { checkReadiness } from '@spinassay/store';
import type { Handler } from '../../http/answer.ts';

/** `GET /readyz`: 200 when the database answers and holds the migrations this build expects, else 503. */
export const readReadiness: Handler = async (_request, { store }) => {
  const { databaseAnswers, migrationsCurrent, detail } = await checkReadiness(store);
  const isReady = databaseAnswers && migrationsCurrent;
  const json: Readiness = {
    status: isReady ? 'ready' : 'not-ready',
    checks: [
      { name: 'database', passed: databaseAnswers, detail },
      { name: 'migrations', passed: migrationsCurrent, detail },
    ],
  };
  return { status: isReady ? 200 : 503, headers: { 'Cache-Control': 'no-store' }, json };
};
