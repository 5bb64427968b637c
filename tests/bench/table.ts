import type { EntryReport } from './entry.ts';

const short = (value: number | null): string =>
  value === null ? '–' : value.toLocaleString('en', { maximumSignificantDigits: 3 });

const HEAD = ['measured', 'ours', 'compared', 'ratio', 'target', ''];

/** A table for people: one line per entry, its further figures below it. */
export const asTable = (reports: readonly EntryReport[]): string => {
  const rows = reports.map((r) => [
    r.name,
    short(r.a),
    short(r.b),
    short(r.ratio),
    r.target === null ? '–' : `≤ ${r.target}`,
    r.verdict,
  ]);
  const widths = HEAD.map((head, k) =>
    Math.max(head.length, ...rows.map((row) => (row[k] ?? '').length)),
  );
  const line = (cells: readonly string[]): string =>
    cells
      .map((cell, k) => (k === 0 ? cell.padEnd(widths[k] ?? 0) : cell.padStart(widths[k] ?? 0)))
      .join('  ')
      .trimEnd();
  const notes = (report: EntryReport): string[] => {
    const facts = Object.entries(report.info).map(([name, value]) => `${name} ${value ?? '–'}`);
    return facts.length > 0 ? [`    ${facts.join(' · ')}`] : [];
  };
  return [
    line(HEAD),
    ...reports.flatMap((report, k) => [line(rows[k] ?? []), ...notes(report)]),
  ].join('\n');
};
