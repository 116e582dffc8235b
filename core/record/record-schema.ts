import * as z from 'zod';
import type { RollUpRecord } from './record.ts';

/** The record's shape as zod sees it; strict in what is there, lenient to keys that a later version adds. */
const number = z.number();
const vector3 = z.array(number).length(3);
const rows = z.tuple([vector3, vector3, vector3]);
const place = z.object({ file: z.string(), line: number });
const text = z.string().nullable();
const inertia = z.object({ aboutCentre: rows, aboutOrigin: rows });
const body = z.object({ mass: number, centre: vector3.nullable(), inertia: inertia.nullable() });
const principal = z.object({
  moments: vector3,
  axes: rows,
  nearest: z.array(z.enum(['x', 'y', 'z'])).length(3),
  free: z.array(number),
  tilt: vector3,
  quaternion: z.array(number).length(4),
});
const totals = z.object({
  ...body.shape,
  principal: principal.nullable(),
  gyration: vector3.nullable(),
});
const group = z.object({
  name: text,
  basic: body,
  predicted: body,
  share: z.object({ basic: number, predicted: number }),
});
const limit = z.object({
  name: z.string(),
  id: text,
  quantity: z.string(),
  of: text,
  frame: text,
  on: z.enum(['basic', 'predicted']),
  unit: z.string(),
  shown: z.object({ unit: z.string(), factor: number }),
  value: number.nullable(),
  values: z.object({ basic: number.nullable(), predicted: number.nullable() }),
  min: number.nullable(),
  max: number.nullable(),
  nearest: z.enum(['min', 'max']),
  margin: number.nullable(),
  marginOfLimit: number.nullable(),
  verdict: z.enum(['within', 'outside']),
  waiver: z.object({ until: z.string(), reason: z.string(), by: z.string() }).nullable(),
  source: text,
  owner: text,
  note: text,
  at: place,
  heaviest: z.array(z.object({ path: z.string(), at: place, value: number })),
});
const partBody = z.object({ mass: number, centre: vector3, inertia: rows });
const part = z.object({
  path: z.string(),
  at: place,
  kind: z.string(),
  cut: z.boolean(),
  own: z.boolean(),
  maturity: text,
  category: text,
  basis: text,
  growth: number,
  basic: partBody,
  predicted: partBody,
  share: z.object({ mass: number, xx: number, yy: number, zz: number }),
  note: text,
  source: text,
  mesh: z
    .object({
      format: z.string(),
      triangles: number,
      vertices: number,
      collapsed: number,
      shells: number,
      voids: number,
      openEdges: number,
      volume: number,
      area: number,
      size: vector3,
    })
    .optional(),
});

export const recordSchema: z.ZodType<RollUpRecord> = z.object({
  schema: z.literal('steelyard-record/1'),
  stamp: z.string().regex(/^[0-9a-f]{64}$/),
  assembly: z.string(),
  state: z.string(),
  conventions: z.object({
    frame: z.object({ origin: z.string(), x: z.string(), y: z.string(), z: z.string() }).nullable(),
    products: z.literal('negative'),
    units: z.literal('SI'),
    coreVersion: z.string(),
    fileUnits: z.object({
      length: z.string(),
      mass: z.string(),
      angle: z.string(),
      density: z.string(),
      inertia: z.string(),
    }),
    growth: z.boolean(),
  }),
  basic: totals,
  predicted: totals,
  frames: z.record(
    z.string(),
    z.object({ note: text, at: vector3, axes: rows, basic: body, predicted: body }),
  ),
  byCategory: z.array(group),
  byBasis: z.array(group),
  uncertainty: z.null(),
  limits: z.array(limit),
  parts: z.array(part),
  overrides: z.array(z.object({ path: z.string(), reason: z.string(), at: place, from: number, to: number })),
  warnings: z.array(z.object({ code: z.string(), message: z.string(), at: place.nullable() })),
  parameters: z.record(z.string(), z.object({ value: number, unit: z.string() })),
  inputs: z.array(
    z.object({
      path: z.string(),
      sha256: z.string().regex(/^[0-9a-f]{64}$/),
      text: z.string().optional(),
      bytes: number.optional(),
    }),
  ),
  provenance: z.object({
    tool: z.string(),
    node: z.string().optional(),
    commit: z.string().optional(),
    branch: z.string().optional(),
    tag: z.string().optional(),
    remote: z.string().optional(),
    author: z.string().optional(),
    dirty: z.boolean().optional(),
    ci: z
      .object({
        name: z.string(),
        run: z.string().optional(),
        url: z.string().optional(),
        request: z.string().optional(),
      })
      .optional(),
    at: z.string(),
  }),
}) as z.ZodType<RollUpRecord>;
