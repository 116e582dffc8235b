import type { ReactNode } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { lineAnchor, type Place } from './line-anchor.ts';

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
