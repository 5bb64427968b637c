import { access } from 'node:fs/promises';
import { basename } from 'node:path';
import type { UserActor } from '#shared/access/actors.ts';
import type { InPractice } from '#server/db/in-practice.ts';
import type { Storage } from '#server/storage/storage.ts';
import { tell } from '../../events/tell.ts';
import { Problem } from '../../http/problem.ts';
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

const isHere = (path: string): Promise<boolean> =>
  access(path).then(
    () => true,
    () => false,
  );

/**
 * After an error of the machine nobody knows whether the commit came through: a clip that is there keeps its file, and
 * so does a sender who comes back for it. Where that cannot be asked, a stray file is better than a clip without film.
 */
const isWanted = (inPractice: InPractice, actor: UserActor, id: string): Promise<boolean> =>
  inPractice(
    actor,
    async ({ em }) => (await em.count(Clip, { id })) + (await em.count(Upload, { id })) > 0,
  ).catch(() => true);

/**
 * Takes a complete file in: it moves to its place, then the clip and the job that prepares it are committed
 * together. Refused, the file is gone; cut short, it lies in its place already when it is asked for again.
 */
export const acceptClip = async (
  ground: { readonly inPractice: InPractice; readonly storage: Storage },
  actor: UserActor,
  visitId: string,
  file: ReceivedFile,
  id: string,
  order: JobOrder = {},
): Promise<string> => {
  const { inPractice, storage } = ground;
  const { practiceId } = actor;
  const files = clipFiles(practiceId, id);
  if ((await isHere(file.path)) || !(await storage.exists(files.original)))
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
    if (error instanceof Problem || !(await isWanted(inPractice, actor, id)))
      await storage.deleteAll(clipPrefix(practiceId, id));
    throw error;
  }
  return id;
};
