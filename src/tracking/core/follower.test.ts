import { describe, expect, it } from 'vitest';
import { Follower, type Seen } from './follower.ts';
import type { Place } from './flow.ts';
import { type Plane, planeOf } from './plane.ts';

const WIDTH = 320;
const HEIGHT = 320;
const RADIUS = 6;

/** A wall of even grain, the same on every picture. */
const wall = (x: number, y: number): number =>
  120 + 12 * Math.sin(x / 9 + y / 23) + 9 * Math.cos(y / 7 - x / 31);

/** A light ring with a dark middle, smeared upright over `smear` pixels. */
const ringAt = (x: number, y: number, dot: Place, smear: number): number => {
  const nearest = dot.y + Math.min(smear / 2, Math.max(-smear / 2, y - dot.y));
  const away = Math.hypot(x - dot.x, y - nearest);
  if (away > RADIUS) return NaN;
  return away > RADIUS / 2 ? 240 : 30;
};

const picture = (dots: readonly Place[], smear = 0): Plane => {
  const data = new Uint8Array(WIDTH * HEIGHT);
  for (let y = 0; y < HEIGHT; y += 1)
    for (let x = 0; x < WIDTH; x += 1) {
      const rings = dots.map((dot) => ringAt(x, y, dot, smear)).filter(Number.isFinite);
      data[y * WIDTH + x] = Math.round(rings[0] ?? wall(x, y));
    }
  return planeOf(data, WIDTH, HEIGHT);
};

const HOME = { x: 160, y: 240 };
const OTHER = { x: 160, y: 110 };

const away = (seen: Seen | undefined, from: Place): number =>
  seen?.place ? Math.hypot(seen.place.x - from.x, seen.place.y - from.y) : NaN;

describe('a point that was lost', () => {
  it('is found again where a hand had placed it, not on the like dot it vanished beside', () => {
    const follower = new Follower(picture([HOME, OTHER]), HOME);
    // it rises towards the other dot, vanishes, and stands at its own place again
    for (let y = HOME.y - 8; y >= 160; y -= 8) follower.step(picture([{ x: HOME.x, y }, OTHER]));
    for (let n = 0; n < 8; n += 1) expect(follower.step(picture([])).state).toBe('lost');
    const back = [0, 1, 2, 3, 4, 5].map(() => follower.step(picture([HOME, OTHER])));
    expect(away(back[0], HOME)).toBeLessThan(0.5);
    expect(back[0]?.state).toBe('unsure');
    // it looks and stands as it did: a person need not look twice
    expect(back.at(-1)?.state).toBe('sure');
  });
});
