import type { ReactNode } from 'react';
import type { Sort } from './history-view.ts';

/** A column's head by which the list can be sorted; again turns the order round. */
export function SortHead({
  sort,
  down,
  up,
  onSort,
  numeric = false,
  children,
}: {
  sort: Sort;
  /** Largest or newest first. */
  down: Sort;
  up: Sort;
  onSort: (sort: Sort) => void;
  numeric?: boolean;
  children: ReactNode;
}) {
  const state = sort === down ? 'descending' : sort === up ? 'ascending' : 'none';
  return (
    <th
      // biome-ignore lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
      role="columnheader"
      scope="col"
      aria-sort={state}
      className={numeric ? 'n' : undefined}
    >
      <button
        type="button"
        className="word"
        title={`${sort === down ? up : down} first`}
        onClick={() => onSort(sort === down ? up : down)}
      >
        {children}
        <span aria-hidden="true" className="ml-1 inline-block w-2 text-brass">
          {state === 'descending' ? '↓' : state === 'ascending' ? '↑' : ''}
        </span>
      </button>
    </th>
  );
}
