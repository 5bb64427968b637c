import { describe, expect, it } from 'vitest';
import { seenSubstitution } from '#shared/contracts/calls.ts';
import { EXERCISES } from '#shared/plan/library.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { pdfPages } from '#tests/support/pdf-text.ts';
import { emptyReport } from '#tests/support/one-of-each.ts';
import { aReading, resultOf } from '#tests/support/side-page.ts';
import { readingOf } from '../gather-report.ts';
import type { ReportContent, ReportPlan, ReportSide } from '../report-content.ts';
import { MOST_PAGES, writeReport } from './write-report.ts';

const OF = { number: 2, at: '2026-03-04T12:00:00Z', by: 'Maren Okafor' };

const aSide = (side: 'left' | 'right', calls: number, trial: string | null): ReportSide => ({
  side,
  calls: Array.from({ length: calls }, () => ({
    seen: 'early' as const,
    confidence: 'fairly-sure' as const,
    substitutions: seenSubstitution.options,
    at: '2026-03-03T10:00:00Z',
    gates: STANDARD_GATES,
    beforeFigures: true,
  })),
  calledBy: Array.from({ length: calls }, (_, n) => `Caller ${n + 1}`),
  reading: trial === null ? null : readingOf(aReading(resultOf(trial))),
  review: { state: 'signed-off', by: 'Tobias Lindqvist', at: OF.at, about: 'reading' },
});

const aPlan = (side: 'left' | 'right', exercises: number, cue: string): ReportPlan => ({
  side,
  givenAt: OF.at,
  givenBy: 'Maren Okafor',
  retestOn: '2026-04-14',
  note: cue.repeat(5),
  items: EXERCISES.slice(0, exercises).map(({ name, purpose, dose }) => ({
    ...{ name, side, purpose, dose, cue },
  })),
});

const made = async (change: Partial<ReportContent>) => {
  const { pdf, pages } = await writeReport({ ...emptyReport('Zoë Łękawska'), ...change }, OF);
  const texts = pdfPages(pdf);
  expect(texts).toHaveLength(pages);
  return { pages, text: texts.join(' ') };
};

describe('a report on paper', () => {
  it('of a call by eye alone takes one page or two and says what was not measured', async () => {
    const { pages, text } = await made({ sides: [aSide('left', 1, null)] });
    expect(pages).toBeLessThanOrEqual(2);
    // a letter of another file begins a run of its own
    expect(text).toMatch(/Zoë Łę ?kawska/);
    expect(text).toContain('no rep with the right leg lifted carries a mark');
    expect(text).not.toContain('Shortened');
  });

  it('of both sides with a plan leaves nothing out', async () => {
    const { pages, text } = await made({
      sides: [aSide('left', 2, 'g04_expected_big'), aSide('right', 2, 'g02_early_mid_3rep')],
      compared: { difference: -11.2, plusMinus: 5, differ: true },
      plans: [aPlan('right', 4, 'Slowly.')],
    });
    expect(pages).toBeLessThanOrEqual(MOST_PAGES);
    expect(text).not.toContain('Shortened');
    expect(text).toContain('The sides differ beyond the error.');
    for (const { name } of EXERCISES.slice(0, 4)) expect(text).toContain(name);
    expect(text.match(/Cue: Slowly\./g)).toHaveLength(4);
  });

  it('takes three pages however much there is to say, and says what is left out', async () => {
    const cue = 'Let the weight come over the whole foot first, then lift. '.repeat(6);
    const { pages, text } = await made({
      sides: [aSide('left', 30, 'g04_expected_big'), aSide('right', 30, 'g02_early_mid_3rep')],
      compared: { difference: -11.2, plusMinus: 5, differ: true },
      plans: [aPlan('left', 20, cue), aPlan('right', 20, cue)],
    });
    expect(pages).toBe(MOST_PAGES);
    const told = Math.min(20, EXERCISES.length) - 8;
    expect(text).toContain(
      `Shortened to fit on 3 pages; left out: 56 calls by eye between the first and the last, ${2 * told} exercises,`,
    );
    expect(text).toContain('Seen by Caller 1,');
    expect(text).toContain('Seen by Caller 30,');
    expect(text).not.toContain('Seen by Caller 2,');
    expect(text).toContain('Limits');
  });
});
