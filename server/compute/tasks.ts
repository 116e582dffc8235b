import type { Fault } from '#core/errors.ts';
import type { RollUpRecord } from '#core/record/record.ts';

/** A stored record with everything that it was computed from, as the database keeps it: packed. */
export interface RecomputeTask {
  readonly kind: 'recompute';
  readonly content: Uint8Array;
  /** Packed contents, each once. */
  readonly contents: readonly Uint8Array[];
  /** By path: the place of its content in `contents`. */
  readonly inputs: readonly { readonly path: string; readonly content: number }[];
}

export interface RecomputeResult {
  readonly status: 'recomputed' | 'differs' | 'not recomputable';
  readonly detail: string | null;
  readonly drawing: string | null;
}

/** Files from a browser. */
export interface UploadTask {
  readonly kind: 'upload';
  readonly top: string;
  /** All where null. */
  readonly state: string | null;
  readonly files: readonly { readonly path: string; readonly content: Uint8Array }[];
  readonly tool: string;
  readonly at: string;
}

export type UploadResult =
  | { readonly records: readonly RollUpRecord[]; readonly drawings: readonly string[] }
  | { readonly faults: readonly Fault[] };

export type Task = RecomputeTask | UploadTask;
