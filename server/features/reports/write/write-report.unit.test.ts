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

describe('the key frames of a report', () => {
  const side = {
    ...aSide('left', 1, 'g04_expected_big'),
    keyFrames: {
      clip: '00000000-0000-4000-8000-000000000001',
      head: '00000000-0000-4000-8000-000000000002',
      leftOut: null,
      drawn: {
        view: 'front' as const,
        side: 'left' as const,
        moments: { quiet: 3, from: 9, to: 12, top: 15 },
        overlay: [3, 9, 12, 15].map((frame, n) => ({
          frame,
          marks: [
            { landmark: 'asis-support' as const, u: 60, v: 40, looked: true },
            { landmark: 'asis-lifted' as const, u: 40, v: 40, looked: true },
          ],
          lift: 30 * n,
          liftPlusMinus: 2.2,
          turn: n - 1,
          turnPlusMinus: 4.6,
        })),
      },
    },
  };
  // one grey pixel, JPEG
  const jpeg = Buffer.from(
    '/9j/4AAQSkZJRgABAQEASABIAAD/2wBDAP//////////////////////////////////////////////////////////////////////////////////////wAALCAABAAEBAREA/8QAFAABAAAAAAAAAAAAAAAAAAAACf/EABQQAQAAAAAAAAAAAAAAAAAAAAD/2gAIAQEAAD8AVN//2Q==',
    'base64',
  );
  const stills = side.keyFrames.drawn.overlay.map(({ frame }) => ({
    frame,
    jpeg,
    size: { width: 100, height: 160 },
    from: { u: 0, v: 0 },
    scale: 1,
  }));
  const write = async (pictures: ReadonlyMap<number, typeof stills | string>, more = {}) => {
    const content = { ...emptyReport(), sides: [side], ...more };
    const { pdf } = await writeReport(content, OF, pictures);
    return { pdf, text: pdfPages(pdf).join(' ') };
  };

  it('stand beside each other with their words, and are told to those who cannot see them', async () => {
    const { pdf, text } = await write(new Map([[0, stills]]));
    for (const words of ['Quiet stance', '60° of lift', '90° of lift', 'Top of the lift'])
      expect(text).toContain(words);
    expect(text).toContain('lift under 20°');
    expect(text).toMatch(/lift 60°\s?±\s?3°/);
    expect(text).toContain('The head is hidden in the pictures.');
    const raw = pdf.toString('latin1');
    expect(raw.match(/\/Subtype \/Image/g)).toHaveLength(4);
    // each with words of its own
    expect(raw.match(/\/S \/Figure/g)).toHaveLength(5);
  });

  it('are left out with the reason where there are none', async () => {
    const { pdf, text } = await write(new Map([[0, 'nobody has looked yet']]));
    expect(text).toContain('There are none in this report: nobody has looked yet.');
    expect(pdf.toString('latin1')).not.toContain('/Subtype /Image');
  });

  it('give way where there is more to say than three pages hold', async () => {
    const cue = 'Let the weight come over the whole foot first, then lift. '.repeat(6);
    const { pdf, text } = await write(new Map([[0, stills]]), {
      sides: [
        { ...aSide('left', 30, 'g04_expected_big'), keyFrames: side.keyFrames },
        aSide('right', 30, 'g02_early_mid_3rep'),
      ],
      plans: [aPlan('left', 20, cue), aPlan('right', 20, cue)],
    });
    expect(pdfPages(pdf).length).toBeLessThanOrEqual(MOST_PAGES);
    expect(text).toContain('There are none in this report: there is no room for them');
    expect(pdf.toString('latin1')).not.toContain('/Subtype /Image');
  });
});
