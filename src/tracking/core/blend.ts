import { stateOf } from './certainty.ts';
import type { Seen } from './follower.ts';

/** Apart by more than this, both ways have not found the same, pixels of the picture. */
const SAME = 3;
/** What only one of two ways found, or both found in different places, is not sure by itself. */
const ALONE = 0.8;
const CONTRADICTED = 0.45;

const LOST: Seen = { place: null, confidence: 0, state: 'lost' };

const capped = (seen: Seen, cap: number, share = 1): Seen => {
  const confidence = Math.min(cap, seen.confidence * share);
  return { place: seen.place, confidence, state: stateOf(confidence) };
};

/**
 * One place out of two ways: from the keyframe before and from the one after. `part` is how far the
 * picture lies from the first to the second, 0 to 1. Each keyframe counts most close by, so the
 * track runs into both; where both ways agree the answer is surer than either.
 */
export const blend = (before: Seen, after: Seen, part: number): Seen => {
  const a = before.place;
  const b = after.place;
  if (!a && !b) return LOST;
  if (!a || !b) {
    const alone = capped(a ? before : after, 1, ALONE);
    return alone.state === 'lost' ? LOST : alone;
  }
  const nearBefore = before.confidence * (1 - part);
  const nearAfter = after.confidence * part;
  if (Math.hypot(b.x - a.x, b.y - a.y) > SAME) {
    const likelier = capped(nearBefore >= nearAfter ? before : after, CONTRADICTED);
    return likelier.state === 'lost' ? LOST : likelier;
  }
  const share = nearAfter / (nearBefore + nearAfter);
  const confidence = 1 - (1 - before.confidence) * (1 - after.confidence);
  return {
    place: { x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y) },
    confidence,
    state: stateOf(confidence),
  };
};
