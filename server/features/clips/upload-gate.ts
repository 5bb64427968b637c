import type { UserActor } from '#shared/access/actors.ts';
import type { Side, View } from '#shared/contracts/primitives.ts';
import { cameraStoodOf } from '#shared/records/views.ts';
import { maxBytes, maxBytesADay, maxOpenUploads } from '#server/media/limits.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { needConsent } from '../athletes/consent-check.ts';
import { isMinor } from '../athletes/days.ts';
import { needSafe } from '../visits/safety.ts';
import { type VisitInSight, visitInSight } from '../visits/visit-in-sight.ts';
import { Clip } from './clip.entity.ts';
import { Upload } from './upload.entity.ts';

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

const GB = 1024 ** 3;
const DAY_MS = 86_400_000;

/**
 * Whether one person has room for so many bytes more: what they sent within a day and what is under way count.
 * @throws Problem 'upload-quota'
 */
export const needQuota = async ({ em, actor }: Unit<UserActor>, bytes: number): Promise<void> => {
  const since = new Date(Date.now() - DAY_MS);
  const clips = await em.find(
    Clip,
    { uploadedBy: actor.id, uploadedAt: { $gt: since } },
    { fields: ['bytes'] },
  );
  const uploads = await em.find(Upload, { openedBy: actor.id }, { fields: ['bytes'] });
  if (uploads.length >= maxOpenUploads)
    throw new Problem(
      'upload-quota',
      `${uploads.length} of your uploads are under way. Let them end, or cancel those that you do not want any more.`,
    );
  const sent = [...clips, ...uploads].reduce((sum, one) => sum + one.bytes, 0);
  if (sent + bytes > maxBytesADay)
    throw new Problem(
      'upload-quota',
      `One person may send ${maxBytesADay / GB} GB within a day, and ${(sent / GB).toFixed(1)} GB of that are sent or under way. Send this clip tomorrow.`,
    );
};
