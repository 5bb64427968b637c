import { framePoint } from '#shared/geometry/points.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import type { SpotId } from '#shared/landmarks/spots.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { countTouches, NO_TOUCHES, type StandsOn, type Touches } from '../model/draft.ts';

/** What a person has placed on a clip that has no rep yet. */
export interface Kept {
  readonly touches: Touches;
  readonly standsOn: StandsOn | null;
}

/** Where the touches of one person on one clip are kept, until reps take them as their marks. */
export interface KeptTouches {
  readonly load: () => Kept;
  /** False where this browser keeps nothing: they last as long as the page. */
  readonly save: (kept: Kept) => boolean;
}

type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

const PREFIX = 'redshank-touches';
/** What nobody came back to for this long is taken off the device, ms. */
const KEPT_MS = 30 * 86_400_000;
const NOTHING: Kept = { touches: NO_TOUCHES, standsOn: null };
const STANDS: readonly StandsOn[] = ['left', 'right', 'both'];

const fieldOf = (value: unknown, name: string): unknown =>
  typeof value === 'object' && value !== null ? Reflect.get(value, name) : undefined;
const isCount = (value: unknown): value is number => Number.isInteger(value) && Number(value) >= 0;
const isPixel = (value: unknown): value is number => Number.isFinite(value);

const valueFrom = (kept: unknown): MarkValue | null => {
  if (fieldOf(kept, 'to') === 'hidden') return { to: 'hidden' };
  const [u, v] = ['u', 'v'].map((name) => fieldOf(fieldOf(kept, 'point'), name));
  const pictureLongEdge = fieldOf(kept, 'pictureLongEdge');
  if (!isPixel(u) || !isPixel(v) || !isCount(pictureLongEdge)) return null;
  const point = framePoint(u, v);
  // before there is a rep only a hand places marks
  return { to: 'point', point, source: 'hand', looked: true, confidence: null, pictureLongEdge };
};

const parsed = (text: string | null): unknown => {
  try {
    return text === null ? null : JSON.parse(text);
  } catch {
    // half written or by another program: as if nothing were kept
    return null;
  }
};

/** Reads what was kept; a touch that cannot be read is left out. */
export const readKept = (text: string | null): Kept => {
  const kept = parsed(text);
  const rows = fieldOf(kept, 'touches');
  const touches = new Map<ReturnType<typeof frameIndex>, Map<SpotId, MarkValue>>();
  for (const row of Array.isArray(rows) ? (rows as unknown[]) : []) {
    const [frame, spot] = ['frame', 'spot'].map((name) => fieldOf(row, name));
    const value = valueFrom(fieldOf(row, 'value'));
    if (!isCount(frame) || typeof spot !== 'string' || !value) continue;
    const spots = touches.get(frameIndex(frame)) ?? new Map<SpotId, MarkValue>();
    touches.set(frameIndex(frame), spots.set(spot as SpotId, value));
  }
  const standsOn = fieldOf(kept, 'standsOn');
  return { touches, standsOn: STANDS.find((each) => each === standsOn) ?? null };
};

const written = ({ touches, standsOn }: Kept, at: number): string =>
  JSON.stringify({
    at,
    standsOn,
    touches: [...touches].flatMap(([frame, spots]) =>
      [...spots].map(([spot, value]) => ({ frame, spot, value })),
    ),
  });

const keysOf = (store: Store, prefix: string): string[] =>
  Array.from({ length: store.length }, (_, n) => store.key(n) ?? '').filter((key) =>
    key.startsWith(prefix),
  );

const tidy = (store: Store, now: number): void => {
  for (const key of keysOf(store, PREFIX)) {
    const at = fieldOf(parsed(store.getItem(key)), 'at');
    if (!isCount(at) || now - at > KEPT_MS) store.removeItem(key);
  }
};

const nameOf = (userId: string): string => `${PREFIX} ${userId} `;

/** How many touches a person has on this device, over all clips. */
export const countKept = (userId: string, store: Store): number =>
  keysOf(store, nameOf(userId)).reduce(
    (sum, key) => sum + countTouches(readKept(store.getItem(key)).touches),
    0,
  );

/** Takes everything that a person has touched off this device. */
export const forgetKept = (userId: string, store: Store): void => {
  for (const key of keysOf(store, nameOf(userId))) store.removeItem(key);
};

/** @param store asked for when needed: a browser may forbid even that */
export const keptTouchesOf = (
  userId: string,
  clipId: string,
  store: () => Store,
  now: () => number = Date.now,
): KeptTouches => {
  const key = nameOf(userId) + clipId;
  return {
    load() {
      try {
        tidy(store(), now());
        return readKept(store().getItem(key));
      } catch {
        return NOTHING;
      }
    },
    save(kept) {
      try {
        if (kept.touches.size === 0) store().removeItem(key);
        else store().setItem(key, written(kept, now()));
        return true;
      } catch {
        return false;
      }
    },
  };
};
