import * as z from 'zod';
import type { Difference } from '../difference/types.ts';
import type { RollUpRecord } from '../record/record.ts';

export const VERDICTS = ['within', 'outside', 'unlimited'] as const;
export const SORTS = ['newest', 'oldest', 'heaviest', 'lightest'] as const;
export const PAGE_AT_MOST = 200;

/** What a trend can show: columns of a run, SI, on the judged masses, tensors about the centre in body axes. */
export const TREND_QUANTITIES = [
  'mass',
  'centre.x',
  'centre.y',
  'centre.z',
  'inertia.xx',
  'inertia.yy',
  'inertia.zz',
  'principal.x',
  'principal.y',
  'principal.z',
] as const;
export type TrendQuantity = (typeof TREND_QUANTITIES)[number];

export const recomputationSchema = z.object({
  status: z.enum(['waiting', 'recomputed', 'differs', 'not recomputable']),
  detail: z.string().nullable().describe('where it differs, or why it cannot be computed again'),
});

/** One line of the history. Figures in SI on `on`; principal moments ascending, named by `nearest`. */
export const runRowSchema = z
  .object({
    id: z.string(),
    stamp: z.string(),
    assembly: z.string(),
    state: z.string(),
    commit: z.string().nullable(),
    branch: z.string().nullable(),
    tag: z.string().nullable(),
    dirty: z.boolean(),
    author: z.string().nullable().describe('of the commit'),
    pushedBy: z.string(),
    at: z.string().describe('when it came'),
    computedAt: z.string(),
    on: z.enum(['basic', 'predicted']),
    mass: z.number(),
    centre: z.array(z.number()).nullable(),
    moments: z.array(z.number()).nullable(),
    nearest: z.array(z.string()).nullable(),
    fileUnits: z.object({ length: z.string(), mass: z.string(), inertia: z.string() }),
    verdict: z.enum(VERDICTS),
    outside: z.array(z.string()).describe('names of the limits that are broken'),
    recomputation: recomputationSchema,
    release: z.enum(['asked', 'released', 'withdrawn']).nullable(),
  })
  .meta({ id: 'RunRow' });
export type RunRow = z.infer<typeof runRowSchema>;

export const runFilterSchema = z.object({
  assembly: z.string().optional(),
  state: z.string().optional(),
  branch: z.string().optional(),
  verdict: z.enum(VERDICTS).optional(),
  since: z.iso.date().optional().describe('a day, UTC'),
});
export const listRunsQuerySchema = runFilterSchema.extend({
  sort: z.enum(SORTS).default('newest'),
  cursor: z.string().max(400).optional().describe("the last answer's `next`"),
  limit: z.coerce.number().int().min(1).max(PAGE_AT_MOST).default(50),
});
export const runPageSchema = z.object({ rows: z.array(runRowSchema), next: z.string().nullable() });
export type RunPage = z.infer<typeof runPageSchema>;

export const choicesSchema = z.object({
  assemblies: z.array(z.string()),
  states: z.array(z.string()),
  branches: z.array(z.string()),
});
export type Choices = z.infer<typeof choicesSchema>;

export const trendQuerySchema = runFilterSchema.extend({
  quantity: z.enum(TREND_QUANTITIES).default('mass'),
});
export const trendSchema = z.object({
  assembly: z.string(),
  state: z.string(),
  quantity: z.enum(TREND_QUANTITIES),
  on: z.enum(['basic', 'predicted']),
  unit: z.string().describe('SI'),
  shown: z
    .object({ unit: z.string(), factor: z.number() })
    .describe('the unit of the file and its size in SI'),
  limits: z.array(z.object({ name: z.string(), min: z.number().nullable(), max: z.number().nullable() })),
  points: z
    .array(
      z.object({
        run: z.string(),
        at: z.string(),
        value: z.number(),
        verdict: z.enum(VERDICTS),
        released: z.boolean(),
        label: z.string(),
      }),
    )
    .describe('oldest first, at most 2,000; extremes stay'),
  of: z.number().describe('how many runs the points were taken from'),
});
export type Trend = z.infer<typeof trendSchema>;

export const releaseSchema = z.object({
  state: z.enum(['asked', 'released', 'withdrawn']),
  preparedBy: z.string(),
  preparedAt: z.string(),
  checkedBy: z.string().nullable(),
  checkedAt: z.string().nullable(),
  approvedBy: z.string().nullable(),
  approvedAt: z.string().nullable(),
  reason: z.string().nullable().describe('for releasing with a broken limit'),
  withdrawnBy: z.string().nullable(),
  withdrawnAt: z.string().nullable(),
  withdrawnReason: z.string().nullable(),
});
export type Release = z.infer<typeof releaseSchema>;

export const commentSchema = z.object({
  id: z.number(),
  by: z.string(),
  at: z.string(),
  text: z.string(),
  mine: z.boolean(),
});
export type Comment = z.infer<typeof commentSchema>;
export const addCommentSchema = z.object({ text: z.string().trim().min(1).max(4000) });
export const releaseReasonSchema = z.object({ reason: z.string().trim().max(2000).optional() });
export const withdrawalSchema = z.object({ reason: z.string().trim().min(3).max(2000) });

/** An act on a run: whether you may, and if not, why not, in a sentence. */
const may = z.object({ allowed: z.boolean(), why: z.string().nullable() });

export const runDetailSchema = z.object({
  run: runRowSchema,
  record: (z.looseObject({}) as unknown as z.ZodType<RollUpRecord>).describe(
    'as `steelyard run --format json` prints it; inputs without their text',
  ),
  baseline: runRowSchema
    .nullable()
    .describe('the latest released run of the assembly and state before this one'),
  baselineLimits: z
    .record(z.string(), z.number())
    .describe(
      "the baseline's value of each limit by name [SI]: where the fulcrum of a one-sided beam stands",
    ),
  release: releaseSchema.nullable(),
  comments: z.array(commentSchema),
  hasDrawing: z.boolean(),
  may: z.object({ comment: may, ask: may, check: may, release: may, withdraw: may }),
  needsReason: z
    .boolean()
    .describe('a limit is broken without a valid waiver: a release needs a written reason'),
});
export type RunDetail = z.infer<typeof runDetailSchema>;

export const inputTextsSchema = z.array(
  z.object({
    path: z.string(),
    sha256: z.string(),
    text: z.string().nullable(),
    bytes: z.number().nullable(),
  }),
);
export type InputTexts = z.infer<typeof inputTextsSchema>;

export const comparisonQuerySchema = z.object({
  a: z.string().describe('a run, or `baseline`: the released run before b'),
  b: z.string(),
  on: z.enum(['basic', 'predicted']).optional(),
});
export const comparisonSchema = z.object({
  a: runRowSchema,
  b: runRowSchema,
  difference: (z.looseObject({}) as unknown as z.ZodType<Difference>).describe(
    'as `steelyard diff --format json` prints it',
  ),
  texts: z
    .array(z.object({ path: z.string(), patch: z.string() }))
    .describe('unified differences of the inputs that changed'),
});
export type Comparison = z.infer<typeof comparisonSchema>;
