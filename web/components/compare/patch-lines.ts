/** One line of a unified difference. */
export interface PatchLine {
  readonly kind: 'head' | 'same' | 'added' | 'removed';
  readonly text: string;
  /** Its number in A and in B, where it stands there. */
  readonly a: number | null;
  readonly b: number | null;
}

const HUNK = /^@@ -(\d+)(?:,\d+)? \+(\d+)(?:,\d+)? @@/;

/** Reads a unified difference of one file; what stands before its first hunk is left out. */
export function patchLines(patch: string): PatchLine[] {
  const lines: PatchLine[] = [];
  let a = 0;
  let b = 0;
  let inside = false;
  for (const line of patch.split('\n')) {
    const hunk = HUNK.exec(line);
    if (hunk) {
      inside = true;
      [a, b] = [Number(hunk[1]), Number(hunk[2])];
      lines.push({ kind: 'head', text: `from line ${a} in A, ${b} in B`, a: null, b: null });
      continue;
    }
    if (!inside) continue;
    const text = line.slice(1);
    if (line.startsWith('+')) lines.push({ kind: 'added', text, a: null, b: b++ });
    else if (line.startsWith('-')) lines.push({ kind: 'removed', text, a: a++, b: null });
    else if (line.startsWith(' ')) lines.push({ kind: 'same', text, a: a++, b: b++ });
    else if (line.startsWith('\\'))
      lines.push({ kind: 'head', text: 'no line break at the end of the file', a: null, b: null });
  }
  return lines;
}
