import { readFileSync } from 'node:fs';

/** One published or constructed value; the fixture's head states its conventions. */
export interface ReferenceCase {
  readonly id: string;
  readonly category: string;
  readonly title: string;
  // biome-ignore lint/suspicious/noExplicitAny: each case has its own keys
  readonly inputs: any;
  // biome-ignore lint/suspicious/noExplicitAny: each case has its own keys
  readonly expected: any;
  // biome-ignore lint/suspicious/noExplicitAny: each case has its own keys
  readonly printed?: any;
  readonly source: string;
}

const file = new URL('../fixtures/reference-values.json', import.meta.url);
export const REFERENCE_CASES: readonly ReferenceCase[] = JSON.parse(readFileSync(file, 'utf8')).cases;

export function referenceCase(id: string): ReferenceCase {
  const found = REFERENCE_CASES.find((one) => one.id === id);
  if (!found) throw new Error(`there is no reference case ${id}`);
  return found;
}
