import { plainText } from '../figures/index.ts';

/** A text that a spreadsheet would run as a formula gets an apostrophe in front, as such programs themselves do. */
export function csvCell(value: string | number | boolean | null | undefined): string {
  if (value === null || value === undefined) return '';
  if (typeof value !== 'string') return String(value);
  const plain = plainText(value);
  const safe = /^\s*[=+\-@]/.test(plain) ? `'${plain}` : plain;
  return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}
