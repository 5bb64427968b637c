import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId, Mark } from '#shared/landmarks/types.ts';
import type { Chance } from './chance.ts';

/** How one person marks one clip. */
export interface Marking {
  /** Typical error of an anatomical mark, px of the picture it is placed on. */
  readonly errorPx: number;
  /** Of a pointer or tape. */
  readonly pointerPx: number;
  /** Source pixels per pixel of that picture. */
  readonly scale: number;
  /** Carried from frame to frame by a tracker, whose errors hang together. */
  readonly tracked: boolean;
  /** Chance that a landmark slips off its place during a rep and stays there; none where left out. */
  readonly slips?: number;
}

/** Parts of a mark's error: the same throughout the clip, and its own on every frame. */
const LASTING = 0.6;
const FLEETING = 0.8;
/** Outlines of the pelvis are fainter than other marks. */
const OUTLINE = 1.4;
/** Time over which a tracked mark's error stays much the same, ms. From our model, no source. */
const CARRIED_MS = 600;
/** How far a mark slips, in its typical errors, and how long the rep goes on before it may. From our model, no source. */
const SLIP = 4;
const SLIP_WITHIN_MS = 5000;

const sizeOf = (id: LandmarkId, { errorPx, pointerPx, scale }: Marking): number => {
  switch (landmark(id).errorClass) {
    case 'anatomical':
      return errorPx * scale;
    case 'outline':
      return errorPx * OUTLINE * scale;
    case 'pointer':
      return pointerPx * scale;
  }
};

type Error2 = readonly [u: number, v: number];

/** Marks of a clip's frames in order of time, one landmark after another. */
export const markerOf = (chance: Chance, marking: Marking) => {
  const lasting = new Map<LandmarkId, Error2>();
  const carried = new Map<LandmarkId, { readonly error: Error2; readonly time: number }>();
  const drawn = (size: number): Error2 => [chance.normal(0, size), chance.normal(0, size)];
  const fleeting = (id: LandmarkId, size: number, time: number): Error2 => {
    const before = carried.get(id);
    // a clip that begins anew is tracked anew
    if (!marking.tracked || !before || time < before.time) return drawn(FLEETING * size);
    const kept = Math.exp((before.time - time) / CARRIED_MS);
    const fresh = drawn(FLEETING * size * Math.sqrt(1 - kept * kept));
    return [kept * before.error[0] + fresh[0], kept * before.error[1] + fresh[1]];
  };
  const slipped = new Map<LandmarkId, { readonly from: number; readonly by: Error2 }>();
  /** A slip of this rep, drawn when the rep begins: null where the mark holds. */
  const slipOf = (id: LandmarkId, size: number, time: number): Error2 | null => {
    if (!marking.slips) return null;
    const begins = time < (carried.get(id)?.time ?? Infinity);
    if (begins) {
      slipped.delete(id);
      if (chance.between(0, 1) < marking.slips)
        slipped.set(id, { from: chance.between(0, SLIP_WITHIN_MS), by: drawn(SLIP * size) });
    }
    const slip = slipped.get(id);
    return slip && time >= slip.from ? slip.by : null;
  };
  return (id: LandmarkId, time: number, [u, v]: Error2): Mark => {
    const size = sizeOf(id, marking);
    const still = lasting.get(id) ?? drawn(LASTING * size);
    lasting.set(id, still);
    const slip = slipOf(id, size, time);
    const now = fleeting(id, size, time);
    carried.set(id, { error: now, time });
    return {
      hidden: false,
      point: {
        u: u + still[0] + now[0] + (slip?.[0] ?? 0),
        v: v + still[1] + now[1] + (slip?.[1] ?? 0),
      },
      scale: marking.scale,
      source: marking.tracked ? 'tracked' : 'hand',
      looked: true,
    };
  };
};
