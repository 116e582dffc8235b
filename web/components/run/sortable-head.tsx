import type { ReactNode } from 'react';
import type { PartsSort } from './parts-tree.ts';

/** A column's head by which the parts can be sorted. */
export function SortableHead({
  name,
  value,
  sort,
  onSort,
  numeric = false,
}: {
  name: ReactNode;
  value: PartsSort;
  sort: PartsSort;
  onSort: (sort: PartsSort) => void;
  numeric?: boolean;
}) {
  const here = sort === value;
  const order = value === 'file' ? 'ascending' : 'descending';
  return (
    <th scope="col" aria-sort={here ? order : 'none'} className={numeric ? 'n' : undefined}>
      <button
        type="button"
        className="word"
        title={value === 'file' ? 'in the order of the file' : 'largest share first'}
        onClick={() => onSort(value)}
      >
        {name}
        <span aria-hidden="true" className="ml-1 inline-block w-2 text-brass">
          {here ? (order === 'descending' ? '↓' : '↑') : ''}
        </span>
      </button>
    </th>
  );
}
