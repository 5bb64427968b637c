import { LANDMARK_SETS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { type Act, ACTS, DEFAULT_KEYS, type KeyMap } from '../keys/key-map.ts';
import { EXTRAS, type Extra } from '../model/led.ts';

/** What a person likes, kept in this browser. Nothing of it belongs to an athlete. */
export interface Taste {
  readonly keys: KeyMap;
  /** The landmark set used last; null follows the pointer lengths. */
  readonly set: LandmarkSetId | null;
  readonly extras: readonly Extra[];
  /** CSS px of the magnifier per source px. */
  readonly magnify: number;
}

export const MAGNIFICATIONS = [1.5, 2.6, 4, 8] as const;

export const DEFAULT_TASTE: Taste = {
  keys: DEFAULT_KEYS,
  set: null,
  extras: [],
  magnify: 2.6,
};

const KEY = 'redshank-bench';

const keysFrom = (value: unknown): KeyMap => {
  const keys: Record<Act, string> = { ...DEFAULT_KEYS };
  if (typeof value !== 'object' || value === null) return keys;
  for (const act of ACTS) {
    const key: unknown = Reflect.get(value, act);
    if (typeof key === 'string' && key.length > 0 && key.length < 20) keys[act] = key;
  }
  return keys;
};

/** Reads what was kept; what cannot be read falls back piece by piece. */
export const readTaste = (text: string | null): Taste => {
  let kept: unknown = null;
  try {
    kept = text === null ? null : JSON.parse(text);
  } catch {
    // half written or by another program: as if nothing were kept
  }
  if (typeof kept !== 'object' || kept === null) return DEFAULT_TASTE;
  const set: unknown = Reflect.get(kept, 'set');
  const extras: unknown = Reflect.get(kept, 'extras');
  const magnify: unknown = Reflect.get(kept, 'magnify');
  return {
    keys: keysFrom(Reflect.get(kept, 'keys')),
    set: LANDMARK_SETS.find((each) => each === set) ?? null,
    extras: Array.isArray(extras)
      ? (Object.keys(EXTRAS) as Extra[]).filter((each) => extras.includes(each))
      : [],
    magnify: MAGNIFICATIONS.find((each) => each === magnify) ?? DEFAULT_TASTE.magnify,
  };
};

export const loadTaste = (): Taste => {
  try {
    return readTaste(localStorage.getItem(KEY));
  } catch {
    // storage can be forbidden
    return DEFAULT_TASTE;
  }
};

export const saveTaste = (taste: Taste): void => {
  try {
    localStorage.setItem(KEY, JSON.stringify(taste));
  } catch {
    // full or forbidden: it is then liked for as long as the tab is open
  }
};
