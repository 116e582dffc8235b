import * as z from 'zod';
import { recordSchema } from '../record/record-schema.ts';
import { faultSchema } from './problem.ts';
import { runRowSchema } from './runs.ts';

export const sha256Schema = z.string().regex(/^[0-9a-f]{64}$/);
/** Records in one request. */
export const BATCH_AT_MOST = 50;
/** Bytes of one request once unpacked. */
export const PUSH_BYTES_AT_MOST = 64 * 2 ** 20;
export const INPUT_BYTES_AT_MOST = 256 * 2 ** 20;

/** One record and what tells its pushes apart where there is no commit. */
export const pushItemSchema = z.object({
  record: recordSchema.describe('inputs without their text; each by its SHA-256'),
  key: z
    .string()
    .min(8)
    .max(100)
    .describe('of this push; a record outside git that is sent again under the same key is one run'),
});
export const pushSchema = z.object({ runs: z.array(pushItemSchema).min(1).max(BATCH_AT_MOST) });
export type Push = z.infer<typeof pushSchema>;

/** One answer a record, in order. Status 201 where any is new, 200 where the server had them all. */
export const pushedSchema = z.object({
  runs: z.array(
    z.object({
      status: z.enum(['created', 'known', 'refused']),
      id: z.string().nullable(),
      address: z.string().nullable().describe('of its page'),
      fault: faultSchema.nullable().describe('why it was refused; sending it again will not help'),
    }),
  ),
});
export type Pushed = z.infer<typeof pushedSchema>;

export const missingInputsSchema = z.object({ sha256: z.array(sha256Schema).max(5000) });
export const missingInputsAnswerSchema = z.object({ missing: z.array(sha256Schema) });

/** Either the runs of every state, or the faults of the files; nothing is stored until they are sound. */
export const uploadedSchema = z.object({
  runs: z.array(runRowSchema),
  faults: z.array(faultSchema),
  texts: z.array(z.object({ path: z.string(), text: z.string() })).describe('of the files with faults'),
});
export type Uploaded = z.infer<typeof uploadedSchema>;
