import { beforeEach, describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import type { SpotId } from '#shared/landmarks/spots.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { NO_TOUCHES, type Touches } from '../model/draft.ts';
import { countKept, forgetKept, keptTouchesOf, readKept } from './kept-touches.ts';

const placed = (u: number, v: number): MarkValue => ({
  to: 'point',
  point: framePoint(u, v),
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
});
const TOUCHES: Touches = new Map([
  [
    frameIndex(40),
    new Map<SpotId, MarkValue>([
      ['asis/left' as SpotId, placed(612.25, 1000.5)],
      ['ankle/right' as SpotId, { to: 'hidden' }],
    ]),
  ],
  [frameIndex(52), new Map([['belt-tip' as SpotId, placed(3, 4)]])],
]);
const DAY = 86_400_000;

/** What a browser keeps of one origin. */
class Device implements Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'> {
  readonly #kept = new Map<string, string>();
  get length() {
    return this.#kept.size;
  }
  key = (n: number) => [...this.#kept.keys()][n] ?? null;
  getItem = (key: string) => this.#kept.get(key) ?? null;
  setItem = (key: string, value: string) => void this.#kept.set(key, value);
  removeItem = (key: string) => void this.#kept.delete(key);
}

let device: Device;
beforeEach(() => {
  device = new Device();
});
const of = (user: string, clip: string, at = 0) =>
  keptTouchesOf(
    user,
    clip,
    () => device,
    () => at,
  );

describe('touches before there is a rep', () => {
  it('come back as they were left, with the leg that is stood on', () => {
    expect(of('ana', 'clip').save({ touches: TOUCHES, standsOn: 'left' })).toBe(true);
    expect(of('ana', 'clip').load()).toEqual({ touches: TOUCHES, standsOn: 'left' });
  });
  it('are of one person and one clip', () => {
    of('ana', 'clip').save({ touches: TOUCHES, standsOn: 'left' });
    expect(of('ben', 'clip').load().touches.size).toBe(0);
    expect(of('ana', 'another').load().touches.size).toBe(0);
    expect(countKept('ana', device)).toBe(3);
    expect(countKept('an', device)).toBe(0);
  });
  it('leave nothing behind once reps have taken them, or the person has signed out', () => {
    of('ana', 'clip').save({ touches: TOUCHES, standsOn: 'left' });
    of('ana', 'clip').save({ touches: NO_TOUCHES, standsOn: 'left' });
    expect(device.length).toBe(0);
    of('ana', 'clip').save({ touches: TOUCHES, standsOn: 'left' });
    of('ben', 'clip').save({ touches: TOUCHES, standsOn: 'left' });
    forgetKept('ana', device);
    expect(countKept('ana', device)).toBe(0);
    expect(countKept('ben', device)).toBe(3);
  });
  it('that nobody came back to for a month are taken off the device', () => {
    of('ana', 'old').save({ touches: TOUCHES, standsOn: 'left' });
    of('ana', 'new', 2 * DAY).save({ touches: TOUCHES, standsOn: 'left' });
    of('ana', 'third', 31 * DAY).load();
    expect(of('ana', 'new', 31 * DAY).load().touches).toEqual(TOUCHES);
    expect(of('ana', 'old', 31 * DAY).load().touches.size).toBe(0);
  });
  it('say so where the browser keeps nothing', () => {
    const forbidden = keptTouchesOf('ana', 'clip', () => {
      throw new Error('no storage');
    });
    expect(forbidden.save({ touches: TOUCHES, standsOn: 'left' })).toBe(false);
    expect(forbidden.load().touches.size).toBe(0);
  });
  it('that cannot be read are left out, one by one', () => {
    const rows = [
      { frame: 1, spot: 'belt-tip', value: placed(1, 2) },
      { frame: -1, spot: 'belt-tip', value: placed(1, 2) },
      { frame: 2, spot: 7, value: placed(1, 2) },
      { frame: 3, spot: 'belt-tip', value: { to: 'point', point: { u: 'x', v: 1 } } },
      null,
    ];
    const { touches, standsOn } = readKept(JSON.stringify({ touches: rows, standsOn: 'up' }));
    expect([...touches.keys()]).toEqual([1]);
    expect(standsOn).toBeNull();
    expect(readKept('{ half').touches.size).toBe(0);
    expect(readKept(null).touches.size).toBe(0);
  });
});
