import { randomUUID } from 'node:crypto';
import { basename } from 'node:path';
import type { UserActor } from '#shared/access/actors.ts';
import type { InPractice } from '#server/db/in-practice.ts';
import type { Storage } from '#server/storage/storage.ts';
import { tell } from '../../events/tell.ts';
import { enqueue, type JobOrder } from '../../jobs/job.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { Clip } from './clip.entity.ts';
import { clipFiles, clipPrefix } from './clip-files.ts';
import { PREPARE_CLIP } from './jobs/prepare-clip-type.ts';
import { cameraOf, type ClipFacts, needUploadAllowed } from './upload-gate.ts';
import { Upload } from './upload.entity.ts';

/** A complete file on this machine, on the disk where finished files go. */
export interface ReceivedFile extends ClipFacts {
  readonly path: string;
  readonly bytes: number;
}

/** Control characters, and those that turn the direction of writing around: with them `4pm.exe` reads as `exe.mp4`. */
const UNSHOWN =
  // eslint-disable-next-line no-control-regex -- control characters are what is taken out
  /[\u0000-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069]/g;

/** The last part of a name as the sender's device had it; no path, nothing that cannot be shown. */
export const shownName = (name: string): string =>
  basename(name.replaceAll('\\', '/').replaceAll(UNSHOWN, '')).slice(0, 255) || 'clip';

/**
 * Takes a complete file in: it moves to its place, then the clip and the job that prepares it are committed
 * together. Refused or failed, the file is gone. A clip of this id that is there already is left as it is.
 */
export const acceptClip = async (
  ground: { readonly inPractice: InPractice; readonly storage: Storage },
  actor: UserActor,
  visitId: string,
  file: ReceivedFile,
  id: string = randomUUID(),
  order: JobOrder = {},
): Promise<string> => {
  const { inPractice, storage } = ground;
  const { practiceId } = actor;
  const files = clipFiles(practiceId, id);
  await storage.putFile(files.original, file.path, 'application/octet-stream');
  try {
    await inPractice(actor, async (unit) => {
      const { em } = unit;
      const { visit, athlete } = await needUploadAllowed(unit, visitId);
      const { distanceMm, lensHeightMm, beltPointerMm, thighPointerMm } = visit.filming;
      em.create(Clip, {
        id,
        visit,
        name: shownName(file.name),
        state: 'waiting',
        view: file.view,
        cameraStood: cameraOf(file),
        supportSide: file.supportSide,
        mirrored: file.mirrored,
        bytes: file.bytes,
        files: { ...files, bench: null, replay: null, poster: null, strip: null },
        frames: null,
        facts: null,
        geometry: {
          scale: null,
          distanceMm,
          lensHeightMm,
          beltPointerMm,
          thighPointerMm,
          plumb: null,
          floorLine: null,
          shutter: null,
        },
        uploadedBy: em.getReference(User, actor.id),
      });
      await em.nativeDelete(Upload, { id });
      audit(unit, 'clip.upload', id, {
        athlete: athlete.id,
        visit: visitId,
        bytes: file.bytes,
      });
      await enqueue(unit, PREPARE_CLIP, { clipId: id }, order);
      await tell(
        unit,
        { coachId: athlete.coach.id },
        {
          type: 'clip',
          clipId: id,
          visitId,
          state: 'waiting',
          progress: null,
          secondsLeft: null,
        },
      );
    });
  } catch (error) {
    await storage.deleteAll(clipPrefix(practiceId, id));
    throw error;
  }
  return id;
};
