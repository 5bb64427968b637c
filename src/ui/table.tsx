import type { ReactNode } from 'react';
import { cx } from './class-names.ts';

export type Column<Row> = {
  key: string;
  label: string;
  cell: (row: Row) => ReactNode;
  /** Stands at the right edge on a wide page. */
  end?: boolean;
  /** A narrow page has no headings: there it is a line of its own that begins with its label. */
  named?: boolean;
  /** For a heading that sorts: its state, and what stands in place of the plain label. */
  sort?: 'ascending' | 'descending' | 'none';
  heading?: ReactNode;
};

/**
 * A table that becomes two-line rows on a narrow page. The first column names the row. The roles are spelt
 * out because `display: block` takes them away.
 */
export function Table<Row>({
  caption,
  columns,
  rows,
  rowKey,
}: {
  /** Read out, not seen: the section's heading says it to the eye. */
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
}) {
  return (
    <table className="table" role="table">
      <caption className="sr-only">{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          {columns.map(({ key, label, end, sort, heading }) => (
            <th
              key={key}
              scope="col"
              role="columnheader"
              aria-sort={sort}
              className={cx(end && 'table-end')}
            >
              {heading ?? label}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={rowKey(row)} role="row">
            {columns.map(({ key, label, cell, end, named }, n) =>
              n === 0 ? (
                <th key={key} scope="row" role="rowheader">
                  {cell(row)}
                </th>
              ) : (
                <td
                  key={key}
                  role="cell"
                  className={cx(end && 'table-end', named && 'table-named')}
                >
                  {named && (
                    <span aria-hidden="true" className="text-soft tablet:hidden">
                      {label}:{' '}
                    </span>
                  )}
                  {cell(row)}
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
