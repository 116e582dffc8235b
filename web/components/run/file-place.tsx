import type { ReactNode } from 'react';
import { Link, useLocation } from 'react-router-dom';

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

/** `drone.yaml:58`, or other words, as a link to that line of the inputs below; the folders stand in its title. */
export function FilePlace({ at, children }: { at: Place; children?: ReactNode }) {
  const { search } = useLocation();
  const name = at.file.slice(at.file.lastIndexOf('/') + 1);
  return (
    <Link
      to={{ search, hash: encodeURI(lineAnchor(at)) }}
      preventScrollReset
      className={children === undefined ? 'code whitespace-nowrap' : ''}
      title={`${at.file}:${at.line}`}
    >
      {children ?? `${name}:${at.line}`}
    </Link>
  );
}
