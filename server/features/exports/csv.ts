import { stringify } from 'csv-stringify/sync';
import type { Cell } from '#shared/exports/frame-rows.ts';

/**
 * RFC 4180: CRLF, quotes where they are needed. Text that a spreadsheet would take for a formula is
 * defused with an apostrophe; numbers are numbers, and a negative one stays what it is.
 */
export const csvText = (columns: readonly string[], rows: readonly (readonly Cell[])[]): string =>
  stringify(
    [columns, ...rows].map((row) => row.map(defused)),
    { record_delimiter: 'windows' },
  );

/** What starts a formula, also in its full-width form and behind a tab or a line break. */
const FORMULA = /^[\s\uFEFF]*[=+\-@＝＋－＠]/;

const defused = (cell: Cell): Cell =>
  typeof cell === 'string' && FORMULA.test(cell) ? `'${cell}` : cell;
