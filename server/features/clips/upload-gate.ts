import type { UserActor } from '#shared/access/actors.ts';
import type { Side, View } from '#shared/contracts/primitives.ts';
import { cameraStoodOf } from '#shared/records/views.ts';
import { maxBytes } from '#server/media/limits.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { needConsent } from '../athletes/consent-check.ts';
import { isMinor } from '../athletes/days.ts';
import { needSafe } from '../visits/safety.ts';
import { type VisitInSight, visitInSight } from '../visits/visit-in-sight.ts';

/** How a clip was filmed, as whoever sends it says. */
export interface ClipFacts {
  readonly name: string;
  readonly view: View;
  readonly supportSide: Side | null;
  readonly mirrored: boolean;
}

/**
 * Whether a clip may be taken in for this visit: asked before a byte of it is read, and again when it is complete.
 * @throws Problem 'not-found', 'not-allowed', 'consent-missing', 'safety-check-missing' or 'safety-check-stops'
 */
export const needUploadAllowed = async (
  unit: Unit<UserActor>,
  visitId: string,
): Promise<VisitInSight> => {
  const sight = await visitInSight(unit, visitId, 'clip.upload');
  await needConsent(unit.em, sight.athlete.id, 'assessment');
  needSafe(sight.visit.safety, isMinor(sight.athlete.birthDate));
  return sight;
};

/** @throws Problem 'support-side-needed' */
export const cameraOf = ({ view, supportSide }: ClipFacts) => {
  const stood = cameraStoodOf(view, supportSide);
  if (stood === null) throw new Problem('support-side-needed');
  return stood;
};

/** @throws Problem 'body-too-large' */
export const needSize = (bytes: number): void => {
  if (bytes > maxBytes)
    throw new Problem(
      'body-too-large',
      `A clip may weigh up to ${maxBytes / 1024 ** 3} GB. Cut it to the part that matters, or film it at 1080p.`,
    );
};
