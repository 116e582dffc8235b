import type { ReactNode } from 'react';

export interface Column<T> {
  readonly key: string;
  /** The head; also the label of a value where the table becomes pairs. Empty for a column of controls. */
  readonly head: string;
  readonly unit?: string;
  readonly cell: (row: T) => ReactNode;
  /** Right-aligned in the figures' type. */
  readonly numeric?: boolean;
}

/**
 * A table of people, tokens and the like: hairlines, first column as the row's head; on a narrow screen each row turns
 * into pairs of label and value. Roles are written out because `display` would take them away.
 */
export function DataTable<T>({
  caption,
  columns,
  rows,
  keyOf,
}: {
  /** For screen readers; the section's head says it to the eye. */
  caption: string;
  columns: readonly Column<T>[];
  rows: readonly T[];
  keyOf: (row: T) => string | number;
}) {
  return (
    // biome-ignore-start lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
    // biome-ignore-start lint/a11y/useSemanticElements: the same.
    <table className="pairs" role="table">
      <caption className="sr-only">{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          {columns.map((column) => (
            <th key={column.key} role="columnheader" scope="col" className={column.numeric ? 'n' : undefined}>
              {column.head === '' ? <span className="sr-only">Acts</span> : column.head}
              {column.unit !== undefined && <i> {column.unit}</i>}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={keyOf(row)} role="row">
            {columns.map((column, i) =>
              i === 0 ? (
                <th key={column.key} role="rowheader" scope="row">
                  {column.cell(row)}
                </th>
              ) : (
                <td
                  key={column.key}
                  role="cell"
                  data-label={column.head}
                  className={column.numeric ? 'n' : undefined}
                >
                  <span>{column.cell(row)}</span>
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </table>
    // biome-ignore-end lint/a11y/useSemanticElements: the same.
    // biome-ignore-end lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
  );
}
