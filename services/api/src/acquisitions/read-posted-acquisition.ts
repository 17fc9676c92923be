import { type ReadAcquisition, type Reading, readAcquisition, readJsonSignal } from '@spinassay/acquisition-formats';
import { acquisitionPostSchema, type Conditions, conditionsSchema } from '@spinassay/contract';
import { jsonPointer, type ProblemError, type ProblemFault } from '@spinassay/problems';
import { parseJson } from '../http/parse-json.ts';
import { parseWith } from '../http/parse-with.ts';
import { problemWithFaults } from '../http/problem-with-faults.ts';
import type { ReceivedBody } from '../http/read-body.ts';

/** A signal that was read, with what its sender declared and what its file says. */
export type PostedAcquisition = {
  readonly acquisition: ReadAcquisition;
  readonly declared: Conditions;
  readonly fromFile: Conditions;
};

/**
 * Read the body of `POST /v1/acquisitions`: a JCAMP-DX file as it is, or JSON around a file or numbers.
 *
 * @throws ProblemError malformed-json, invalid-body, unreadable-acquisition with every fault at once
 */
export function readPostedAcquisition({ mediaType, bytes }: ReceivedBody): PostedAcquisition {
  if (mediaType !== 'application/json') return withConditions(readAcquisition(bytes), {}, []);
  const { jcampDx, signal, conditions = {} } = parseWith(acquisitionPostSchema, parseJson(bytes));
  if (jcampDx !== undefined) return withConditions(readAcquisition(jcampDx), conditions, ['jcampDx']);
  if (signal !== undefined) return withConditions(readJsonSignal(signal), conditions, ['signal']);
  throw new Error('the schema lets neither jcampDx nor signal be absent');
}

/** @param path where the signal stands in the body; empty when the body is the file itself */
function withConditions(reading: Reading, declared: Conditions, path: readonly string[]): PostedAcquisition {
  const place = path.length === 0 ? {} : { pointer: jsonPointer(path) };
  if (!reading.ok) throw unreadable(reading.faults.map((fault) => ({ ...place, ...fault })));
  const fromFile = conditionsSchema.safeParse(reading.acquisition.declared);
  if (fromFile.success) return { acquisition: reading.acquisition, declared, fromFile: fromFile.data };
  // The file was readable but says something that cannot be, such as a temperature below -150 degrees.
  throw unreadable(
    fromFile.error.issues.map((issue) => ({
      ...place,
      code: 'impossible-condition',
      detail: `the file gives ${issue.path.join('.')}: ${issue.message}`,
    })),
  );
}

function unreadable(faults: readonly ProblemFault[]): ProblemError {
  return problemWithFaults({ slug: 'unreadable-acquisition', subject: 'The acquisition', faults });
}
