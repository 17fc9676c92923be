import { z } from 'zod';

/** One fault of a request. */
const problemFaultSchema = z
  .strictObject({
    pointer: z.string().optional().describe('JSON Pointer into the body as a URI fragment (RFC 6901).'),
    parameter: z.string().optional().describe('Query parameter or header.'),
    line: z.int().min(1).optional().describe('Line of the file, counted from 1.'),
    code: z.string().optional().describe('Kebab-case name of the fault.'),
    detail: z.string(),
  })
  .meta({ id: 'ProblemFault', description: 'One fault of a request.' });

/** RFC 9457. Extension members are allowed at the top level, so this one schema is not strict. */
export const problemSchema = z
  .looseObject({
    type: z.url().describe('Absolute URI of a page that explains this kind of problem.'),
    title: z.string().describe('Constant for a type.'),
    status: z.int().min(400).max(599),
    detail: z.string().describe('How this caller puts it right.'),
    instance: z.string().optional().describe('URI reference that names this occurrence.'),
    errors: z.array(problemFaultSchema).optional(),
  })
  .meta({ id: 'Problem', description: 'A failure as RFC 9457 has it; further members may stand at the top level.' });

export type Problem = z.infer<typeof problemSchema>;
