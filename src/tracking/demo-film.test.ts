import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { loadTruth } from '../../tests/fixtures/clips/truth.ts';
import { greys } from '../../tests/fixtures/takes/film.ts';
import { followAll } from './core/follow-all.ts';

/** About the standing knee: the foot of the lifted leg passes over the strap's inner end. */
const CUT = { left: 340, top: 930, width: 480, height: 480 };
/** Both feet stand still here. */
const START = 40;

const truth = loadTruth('left-expected');
const follow = async (ids: readonly string[]) => {
  const { left, top, ...size } = CUT;
  const crop = `crop=${size.width}:${size.height}:${left}:${top}`;
  const pictures = await greys(truth.file, [crop], { ...size, long: '5.1' });
  const placeOf = (frame: number, id: string) => {
    const [u, v] = truth.frames[frame]?.marks[id] ?? [NaN, NaN];
    return framePoint(u - left, v - top);
  };
  const { tracks, refused } = await followAll(
    {
      points: ids.map((id) => ({
        id,
        keyframes: [{ frame: frameIndex(START), point: placeOf(START, id) }],
      })),
      from: frameIndex(0),
      to: frameIndex(pictures.length - 1),
    },
    {
      source: size,
      picture: (frame) => Promise.resolve(pictures[frame] ?? pictures.at(-1)!),
      breathe: () => Promise.resolve(),
      places: () => undefined,
    },
  );
  const sureOf = (id: string): { frame: number; away: number }[] =>
    (tracks.find((track) => track.id === id)?.places ?? []).flatMap(({ frame, point, state }) => {
      if (state !== 'sure' || !point) return [];
      const real = placeOf(frame, id);
      return [{ frame, away: Math.hypot(point.u - real.u, point.v - real.v) }];
    });
  return { sureOf, refused, count: pictures.length };
};

describe('about the knee of a demo film', { timeout: 300_000 }, () => {
  it('the strap is never surely elsewhere, and on the edges of bare skin nothing is called sure', async () => {
    const { sureOf, refused, count } = await follow([
      ...['strap-inner', 'strap-outer', 'thigh-tip', 'knee-inner', 'knee-outer'],
    ]);
    expect(count).toBeGreaterThan(300);
    expect(refused).toEqual([]);
    for (const id of ['knee-inner', 'knee-outer'])
      expect(
        sureOf(id).filter(({ frame }) => frame !== START),
        id,
      ).toEqual([]);
    for (const id of ['strap-inner', 'strap-outer', 'thigh-tip']) {
      const sure = sureOf(id);
      expect(Math.max(...sure.map(({ away }) => away)), id).toBeLessThanOrEqual(5);
      expect(sure.length, id).toBeGreaterThan(count / 3);
    }
  });
});
