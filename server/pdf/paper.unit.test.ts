import { describe, expect, it } from 'vitest';
import { pdfPages } from '#tests/support/pdf-text.ts';
import { Paper } from './paper.ts';

const COLUMNS = [
  { title: 'Exercise', share: 2 },
  { title: 'Dose', share: 1 },
] as const;

const written = async (rows: number, before = 0) => {
  const paper = await Paper.open({ title: 'Rows', author: 'Wren', made: new Date(0) }, 1);
  paper.y += before;
  paper.table(
    COLUMNS,
    Array.from({ length: rows }, (_, n) => [`row ${n + 1}.`, 'three sets']),
  );
  const { pdf } = await paper.close((page) => `foot ${page}`);
  return { pages: pdfPages(pdf), pdf: pdf.toString('latin1') };
};

describe('a table on paper', () => {
  it('says on each page it goes on to what its columns are', async () => {
    const { pages, pdf } = await written(120);
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) expect(page.match(/Exercise/g)).toHaveLength(1);
    // nothing is lost or said twice over the break
    const rows = pages.join(' ').match(/row \d+\./g);
    expect(rows).toEqual(Array.from({ length: 120 }, (_, n) => `row ${n + 1}.`));
    // read out, the head is there once
    expect(pdf.match(/\/S \/TH\b/g)).toHaveLength(COLUMNS.length);
  });

  it('does not part its head from its first row', async () => {
    for (let before = 640; before <= 740; before += 4) {
      const { pages } = await written(3, before);
      for (const page of pages.filter((each) => each.includes('Exercise')))
        expect(page, `${before} points down`).toContain('row ');
    }
  });
});
