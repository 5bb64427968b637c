import { describe, expect, it } from 'vitest';
import { stagePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { hitRadii } from './hit-radius.ts';

const IDS: readonly LandmarkId[] = ['strap-inner', 'strap-outer', 'kneecap'];
const row = (...xs: number[]) =>
  xs.map((x, n) => ({ landmark: IDS[n] ?? 'ankle-support', at: stagePoint(x, 0) }));

describe('with nothing asked for', () => {
  it('gives a lone mark a target of 44 px', () => {
    expect(hitRadii(row(10), null)).toEqual([22]);
  });

  it('shares the room between neighbours, down to a least size', () => {
    expect(hitRadii(row(0, 30, 34), null)).toEqual([15, 9, 9]);
  });
});

describe('while a landmark is asked for', () => {
  const asked = (x: number | null, landmark: LandmarkId | null = 'thigh-tip') => ({
    landmark,
    expected: x === null ? null : stagePoint(x, 0),
  });

  it('lets a drag take hold of a mark, and leaves the rest of the picture to the asked one', () => {
    expect(hitRadii(row(0, 200), asked(100))).toEqual([14, 14]);
  });

  it('reaches no farther than half way to where the asked one is expected', () => {
    expect(hitRadii(row(0, 200), asked(20))).toEqual([10, 14]);
    expect(hitRadii(row(0), asked(4))).toEqual([5]);
  });

  it('stays small where nothing says where the asked one is', () => {
    expect(hitRadii(row(0, 90), asked(null))).toEqual([8, 8]);
    expect(hitRadii(row(0, 12), asked(null))).toEqual([6, 6]);
  });

  it('places the asked one again where its own mark is pressed', () => {
    expect(hitRadii(row(0, 200), asked(0, 'strap-inner'))).toEqual([0, 14]);
  });

  it('lets a tool that draws begin on a mark', () => {
    expect(hitRadii(row(0, 200), asked(null, null))).toEqual([0, 0]);
  });
});
