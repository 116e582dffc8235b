export interface Place {
  readonly file: string;
  readonly line: number;
}

/** The anchor of one line of one input on the run's page. */
export const lineAnchor = ({ file, line }: Place): string => `line:${file}:${line}`;

/** Reads an anchor back; null where it is none. */
export function readLineAnchor(hash: string): Place | null {
  const found = /^#?line:(.+):(\d+)$/.exec(safelyDecoded(hash));
  return found ? { file: found[1]!, line: Number(found[2]) } : null;
}

function safelyDecoded(hash: string): string {
  try {
    return decodeURIComponent(hash);
  } catch {
    return hash;
  }
}
