import { type Problem, problemSchema } from '@spinassay/contract';
import { type ProblemSlug, problemCatalogue } from '@spinassay/problems';
import { expect } from 'vitest';

/** Hold an answer to RFC 9457 and to the catalogue: media type, absolute type, constant title, equal status. */
export async function expectProblem(response: Response, slug: ProblemSlug): Promise<Problem> {
  const kind = problemCatalogue[slug];
  const text = await response.text();
  expect([response.status, response.headers.get('content-type')], text).toEqual([
    kind.status,
    'application/problem+json',
  ]);
  const problem = problemSchema.parse(JSON.parse(text));
  expect(problem.type).toBe(`${new URL(response.url).origin}/problems/${slug}`);
  expect([problem.title, problem.status]).toEqual([kind.title, kind.status]);
  expect(problem.instance).toMatch(/^urn:uuid:/);
  return problem;
}

/** Where the faults of a problem point. */
export function pointersOf({ errors = [] }: Problem): (string | undefined)[] {
  return errors.map((fault) => fault.pointer ?? fault.parameter);
}
