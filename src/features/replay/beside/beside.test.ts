import { describe, expect, it } from 'vitest';
import type { EarlierLift } from '#shared/contracts/replay-parts.ts';
import { aPublicReplay } from '#tests/support/public-replay.ts';
import { besideCrop } from './beside-crop.ts';
import { stopsOf, togetherOf, togetherText } from './beside-moments.ts';

const matched = (lift: (number | null)[]): EarlierLift['matched'] => ({
  before: [20, 30, 33, 36, 50],
  now: [30, 41, 49, 58, 80],
  lift,
  rising: 4,
});
const earlier = (lift: (number | null)[]): EarlierLift => {
  const { width, height, frames, moments, overlay } = aPublicReplay();
  return {
    visitDay: '2026-01-20',
    view: 'front',
    head: 'shown',
    ...{ width, height, frames, moments, overlay },
    matched: matched(lift),
  };
};

describe('two lifts beside each other', () => {
  it('go through the moments at which both are as high', () => {
    const moments = togetherOf(earlier([40, 61, 88, 100, 70]));
    expect(moments.map(({ first, second }) => [first.frame, second.frame])).toEqual([
      [20, 30],
      [30, 41],
      [33, 49],
      [36, 58],
      [50, 80],
    ]);
    expect(moments.map(togetherText)).toEqual([
      '40°, going up',
      '61°, going up',
      '88°, going up',
      '100°, going up',
      '70°, going down',
    ]);
  });

  it('say no angle where none is told', () => {
    const [moment] = togetherOf(earlier([null, null, null, null, null]));
    expect(moment && togetherText(moment)).toBe('going up');
  });

  it('stop where this lift passes its moments on the way up', () => {
    const moments = togetherOf(earlier([40, 61, 88, 100, 70]));
    const stops = stopsOf(aPublicReplay(), moments);
    expect(stops.map(({ name, frame }) => [name, frame])).toEqual([
      ['60°', 1],
      ['90°', 2],
      ['Top', 3],
    ]);
    expect(stopsOf(aPublicReplay(), [])).toEqual([]);
  });

  it('are shown in one shape, inside their pictures and about the same middle', () => {
    const whole = { width: 1080, height: 1920 };
    for (const crop of [
      { u: 100, v: 700, width: 800, height: 960 },
      { u: 400, v: 100, width: 300, height: 1700 },
      { u: 0, v: 0, width: 1080, height: 1920 },
    ]) {
      const part = besideCrop(crop, whole);
      expect(part.height / part.width).toBeCloseTo(1.55, 6);
      expect(part.u).toBeGreaterThanOrEqual(0);
      expect(part.v).toBeGreaterThanOrEqual(0);
      expect(part.u + part.width).toBeLessThanOrEqual(whole.width + 1e-6);
      expect(part.v + part.height).toBeLessThanOrEqual(whole.height + 1e-6);
    }
    const lying = besideCrop(
      { u: 600, v: 0, width: 900, height: 1080 },
      { width: 1920, height: 1080 },
    );
    expect(lying.height).toBeCloseTo(1080);
    expect(lying.u + lying.width / 2).toBeCloseTo(1050);
  });
});
