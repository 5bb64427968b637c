import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { type Film, filmCompressed } from '../../tests/fixtures/tracking/film.ts';
import {
  DARK_STICKER,
  LIGHT_STICKER,
  makeScene,
  type SceneChoice,
} from '../../tests/fixtures/tracking/scene.ts';
import { dotAt } from './core/dot.ts';
import { followAll } from './core/follow-all.ts';
import { planeOf } from './core/plane.ts';
import { toPicture, toSource } from './core/scale.ts';
import type { Followed, FollowResult } from './types.ts';

/** Rendering, compressing twice and following wait their turn on a busy machine. */
const PATIENCE_MS = 300_000;

interface Judged {
  readonly result: FollowResult;
  /** Root mean square and largest distance from the truth while called sure, pixels. */
  readonly rms: number;
  readonly most: number;
  /** The share of frames on which a point that could be followed was called sure. */
  readonly sure: number;
}

const pictureOf = (film: Film, frame: number) => {
  const { luma } = film.frames[frame] ?? {};
  if (!luma) throw new RangeError(`no frame ${frame}`);
  return planeOf(luma, film.width, film.height);
};

/** Follows every spot from the frame on, both ways. */
const judge = async (film: Film, start: number): Promise<Judged> => {
  const first = film.frames[start];
  if (!first) throw new RangeError(`no frame ${start}`);
  const points = Object.entries(first.truth)
    .filter(([id]) => !first.covered.includes(id))
    .map(([id, { u, v }]) => ({
      id,
      keyframes: [{ frame: frameIndex(start), point: framePoint(u, v) }],
    }));
  const request = { points, from: frameIndex(0), to: frameIndex(film.frames.length - 1) };
  const result = await followAll(request, {
    source: film,
    picture: (frame) => Promise.resolve(pictureOf(film, frame)),
    breathe: () => Promise.resolve(),
    places: () => undefined,
  });
  const errorOf = (id: string, { frame, point }: Followed): number => {
    const truth = film.frames[frame]?.truth[id];
    return point && truth ? Math.hypot(point.u - truth.u, point.v - truth.v) : NaN;
  };
  const followed = result.tracks.filter(({ id }) => result.refused.every((one) => one.id !== id));
  const all = followed.flatMap(({ id, places }) =>
    places.filter(({ frame }) => frame !== start).map((place) => ({ id, place })),
  );
  const errors = all
    .filter(({ place }) => place.state === 'sure')
    .map(({ id, place }) => errorOf(id, place));
  return {
    result,
    rms: Math.sqrt(errors.reduce((sum, error) => sum + error * error, 0) / errors.length),
    most: Math.max(...errors),
    sure: errors.length / all.length,
  };
};

const film = (choice: SceneChoice) => filmCompressed(makeScene(choice));
const blurred = { fps: 30, shutter: 0.6, exposures: 6 };

describe('after a phone’s and the server’s compression', { timeout: PATIENCE_MS }, () => {
  it('stickers stay within 0.15 px, and within 0.6 px at most', async () => {
    const clip = await film({ cloth: 'plain', sticker: DARK_STICKER });
    const { rms, most, sure, result } = await judge(clip, 0);
    expect(result.refused).toEqual([]);
    expect(rms).toBeLessThanOrEqual(0.15);
    expect(most).toBeLessThanOrEqual(0.6);
    expect(sure).toBe(1);

    // a touch beside it snaps to the sticker's middle
    for (const frame of [3, 40]) {
      const { truth = {}, covered = [] } = clip.frames[frame] ?? {};
      for (const [id, place] of Object.entries(truth)) {
        const { x, y } = toPicture(framePoint(place.u, place.v), clip, clip);
        const inside = x > 16 && y > 16 && x < clip.width - 16 && y < clip.height - 16;
        if (covered.includes(id) || !inside) continue;
        const dot = dotAt(pictureOf(clip, frame), { x: x + 5, y: y - 4 });
        const centre = dot && toSource(dot.centre, clip, clip);
        const away = centre ? Math.hypot(centre.u - place.u, centre.v - place.v) : NaN;
        expect(away, `${id} on ${frame}`).toBeLessThan(0.6);
        expect(dot?.tone).toBe('dark');
      }
    }
  });

  it('light stickers on dark cloth do so too', async () => {
    const clip = await film({ cloth: 'plain', sticker: LIGHT_STICKER, grey: 80, seconds: 0.7 });
    const { rms, most } = await judge(clip, 5);
    expect(rms).toBeLessThanOrEqual(0.15);
    expect(most).toBeLessThanOrEqual(0.6);
  });

  it('a smear of 20 ms at 30 frames a second loses no sticker and moves none by 1.2 px', async () => {
    const { rms, most, sure } = await judge(
      await film({ cloth: 'plain', sticker: DARK_STICKER, ...blurred }),
      0,
    );
    expect(rms).toBeLessThanOrEqual(0.25);
    expect(most).toBeLessThanOrEqual(1.2);
    expect(sure).toBeGreaterThan(0.95);
  });

  it('plain clothing stays within 1.5 px', async () => {
    const { rms, sure } = await judge(await film({ cloth: 'plain' }), 0);
    expect(rms).toBeLessThanOrEqual(1.5);
    expect(sure).toBeGreaterThan(0.8);
  });

  it('skin without a mark is refused at the touch, and nothing on it is round', async () => {
    const clip = await film({ cloth: 'bare', seconds: 0.1 });
    const { result } = await judge(clip, 2);
    expect(result.refused.map(({ id }) => id)).toEqual(result.tracks.map(({ id }) => id));
    for (const { places } of result.tracks)
      expect(places.filter(({ point }) => point !== null)).toHaveLength(1);
    for (const { u, v } of Object.values(clip.frames[2]?.truth ?? {}))
      expect(dotAt(pictureOf(clip, 2), { x: u, y: v })).toBeNull();
  });
});

describe('while the lifted leg passes over them', { timeout: PATIENCE_MS }, () => {
  it.each([
    // marked before the lift, and while the leg passes: then a patch holds a piece of it too
    ['stickers', { cloth: 'plain', sticker: DARK_STICKER }, [0, 45]],
    ['patterned cloth', { cloth: 'patterned' }, [0, 45]],
    ['plain cloth', { cloth: 'plain' }, [0]],
  ] as const)('no point on %s is called sure and lies more than 5 px off', async (...trial) => {
    const [, choice, starts] = trial;
    const covering = await film({ ...choice, topDegrees: -70 });
    for (const start of starts) {
      const { most, sure } = await judge(covering, start);
      expect(most, `from ${start}`).toBeLessThanOrEqual(5);
      expect(sure, `from ${start}`).toBeGreaterThan(0.4);
    }
  });
});
