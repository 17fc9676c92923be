import { z } from 'zod';

/** The process answers. Says nothing of what it needs. */
export const healthSchema = z
  .strictObject({ status: z.literal('alive') })
  .meta({ id: 'Health', description: 'The process answers.', examples: [{ status: 'alive' }] });

export type Health = z.infer<typeof healthSchema>;

/** Whether requests can be served: the database answers and holds the migrations this build expects. */
export const readinessSchema = z
  .strictObject({
    status: z.enum(['ready', 'not-ready']),
    checks: z.array(
      z.strictObject({ name: z.enum(['database', 'migrations']), passed: z.boolean(), detail: z.string() }),
    ),
  })
  .meta({
    id: 'Readiness',
    description: 'Whether requests can be served.',
    examples: [{ status: 'ready', checks: [{ name: 'database', passed: true, detail: 'answers' }] }],
  });

export type Readiness = z.infer<typeof readinessSchema>;
