import { describe, expect, it } from 'vitest';
import type { VisitRow } from '#shared/contracts/visits.ts';
import { aVisitRow } from '#tests/support/records.ts';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { comparable, since, trendOf, turnBounds, type TrendPoint } from './trend.ts';

const measured = (change: number | null, u: number | null) => ({
  code: 'early-turn-out',
  label: 'Turns out early',
  gates: STANDARD_GATES,
  change,
  plusMinus: u === null ? null : 1.96 * u,
  u,
  provisional: false,
});
const visit = (day: string, sides: VisitRow['sides']) => aVisitRow({ id: day, day, sides });
const point = (change: number, u: number): TrendPoint => ({
  visitId: 'v',
  day: '2026-02-09',
  label: '',
  gates: STANDARD_GATES,
  change,
  plusMinus: 1.96 * u,
  u,
  provisional: false,
});

describe('trendOf', () => {
  it('takes measured visits only, oldest first, each side by itself', () => {
    const trend = trendOf([
      visit('2026-03-03', [
        { side: 'right', call: 'early', review: 'none', reading: measured(6.8, 1.8) },
      ]),
      visit('2026-02-20', [{ side: 'right', call: 'early', review: 'none', reading: null }]),
      visit('2026-02-09', [
        { side: 'right', call: null, review: 'none', reading: measured(7.4, 1.9) },
        { side: 'left', call: null, review: 'none', reading: measured(null, null) },
      ]),
    ]);
    expect(trend.right.map(({ day }) => day)).toEqual(['2026-02-09', '2026-03-03']);
    expect(trend.left).toEqual([]);
  });
});

describe('what can be compared', () => {
  it('is what was read between the gates of the latest visit', () => {
    const gates = { from: degrees(50), to: degrees(80) };
    const older = { ...point(9, 1), day: '2026-01-05' };
    const latest = { ...point(4, 1), day: '2026-03-03', gates };
    const trend = { right: [older, latest], left: [{ ...point(1, 1), gates }] };
    expect(comparable(trend)).toEqual({
      trend: { right: [latest], left: trend.left },
      gates,
      leftOut: 1,
    });
    expect(comparable({ right: [], left: [] })).toMatchObject({ gates: null, leftOut: 0 });
  });
});

describe('since', () => {
  it('needs more than both errors together to speak of a change', () => {
    // 1.96 × √(1.8² + 1.9²) = 5.13
    expect(since(point(7.4, 1.9), point(2.3, 1.8))).toMatchObject({ changed: false });
    expect(since(point(7.4, 1.9), point(2.2, 1.8))).toMatchObject({ changed: true });
    expect(since(point(7.4, 1.9), point(2.3, 1.8)).plusMinus).toBeCloseTo(5.1297, 3);
  });
});

describe('turnBounds', () => {
  it('holds every error bar and always zero', () => {
    expect(turnBounds({ right: [point(6.8, 2)], left: [point(-9, 2)] })).toEqual([-20, 20]);
    expect(turnBounds({ right: [point(2, 0.5)], left: [] })).toEqual([-10, 10]);
  });
});
