import * as z from 'zod';

/** One fault of an input, as core's `Fault` says it. */
export const faultSchema = z.object({
  code: z.string(),
  message: z.string(),
  at: z.object({ file: z.string(), line: z.number(), column: z.number() }).optional(),
  length: z.number().optional(),
  hint: z.string().optional(),
});

/** Problem details (RFC 9457) with a stable code, and the faults of an input where there are some. */
export const problemSchema = z
  .object({
    type: z.string().describe('about:blank'),
    title: z.string().describe('what went wrong, in a few words'),
    status: z.number(),
    code: z.string().describe('stable; DEVELOPERS.md lists them'),
    detail: z.string().describe('what was found and what was expected'),
    hint: z.string().optional().describe('how to mend it'),
    faults: z.array(faultSchema).optional(),
    requestId: z.string().describe('stands in the log as well'),
  })
  .meta({ id: 'Problem' });

export type Problem = z.infer<typeof problemSchema>;
