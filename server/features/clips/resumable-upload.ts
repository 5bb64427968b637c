import { rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { FileStore } from '@tus/file-store';
import { Server, Upload as TusUpload } from '@tus/server';
import type { RequestHandler, Response } from 'express';
import type { UserActor } from '#shared/access/actors.ts';
import { PROBLEMS } from '#shared/contracts/problems.ts';
import { routes } from '#shared/contracts/routes.ts';
import { maxBytes } from '#server/media/limits.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { staffOf } from '../../http/session.ts';
import type { Feature } from '../../main/feature.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import { acceptClip, shownName } from './accept-clip.ts';
import { Clip } from './clip.entity.ts';
import { clipFiles } from './clip-files.ts';
import { giveUpUpload } from './give-up-upload.ts';
import { openUpload } from './open-upload.ts';
import { cameraOf, needQuota, needSize, needUploadAllowed } from './upload-gate.ts';
import { Upload } from './upload.entity.ts';

const UPLOADS = '/api/uploads';
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/**
 * An upload that is under way.
 * @throws Problem 'not-found' or 'consent-withdrawn'
 */
const uploadInSight = async (unit: Unit<UserActor>, id: string): Promise<Upload> => {
  const upload = found(await unit.em.findOne(Upload, { id }, { populate: ['visit.athlete'] }));
  const athlete = upload.visit.unwrap().athlete.unwrap() as Athlete;
  needCaseload(unit.actor, 'clip.upload', athlete);
  await needOpen(unit, athlete, 'clip.upload');
  return upload;
};

/**
 * Clips that come in pieces, by the tus protocol 1.0.0: after a lost connection the sender asks how much has
 * arrived and goes on from there. The last byte makes the clip.
 */
export const resumableUploadFeature: Feature = ({ serve, router, ground }) => {
  const { storage, inPractice, sessions } = ground;
  const store = new FileStore({ directory: storage.incoming });
  const pathOf = (id: string) => join(storage.incoming, id);

  /** Makes the clip of a complete upload; done before, it does nothing. */
  const finish = async (actor: UserActor, id: string): Promise<void> => {
    const upload = await inPractice(actor, ({ em }) => em.findOne(Upload, { id }));
    if (!upload) return;
    const { name, view, supportSide = null, mirrored, bytes } = upload;
    const file = { path: pathOf(id), name, view, supportSide, mirrored, bytes };
    // first: killed afterwards, nobody would come back for it
    await rm(`${pathOf(id)}.json`, { force: true });
    await acceptClip(ground, actor, upload.visit.id, file, id);
  };

  /** Who sends which upload: the protocol's own hooks do not know of sessions. */
  const senders = new Map<string, UserActor>();
  const tus = new Server({
    path: UPLOADS,
    datastore: store,
    maxSize: maxBytes,
    relativeLocation: true,
    disableTerminationForFinishedUploads: true,
    onUploadFinish: async (_req, { id }) => {
      const actor = senders.get(id);
      if (!actor) throw new Error('An upload ended that nobody sends.');
      await finish(actor, id).catch((error: unknown) => {
        const problem = error instanceof Problem ? error : new Problem('unexpected');
        if (problem !== error) ground.log.error({ err: error }, 'an upload was not taken in');
        const [status_code] = PROBLEMS[problem.code];
        throw Object.assign(new Error(problem.code), {
          status_code,
          body: JSON.stringify({ code: problem.code, detail: problem.detail }),
        });
      });
      return {};
    },
  });

  /** Whether it is under way; what is whole but not taken in yet, because the server was killed, is taken in now. */
  const isUnderWay = async (actor: UserActor, id: string): Promise<boolean> => {
    const upload = await inPractice(actor, async (unit) =>
      (await unit.em.findOne(Upload, { id })) ? uploadInSight(unit, id) : null,
    );
    if (!upload) return false;
    const received = await stat(pathOf(id)).catch(() => null);
    const isWhole = received
      ? received.size === upload.bytes
      : await storage.exists(clipFiles(actor.practiceId, id).original);
    if (!isWhole) return true;
    await finish(actor, id);
    return false;
  };

  /** Whole and taken in, but the answer was lost on its way: the same answer again. */
  const answerDone = async (actor: UserActor, id: string, res: Response): Promise<void> => {
    const clip = await inPractice(actor, ({ em }) =>
      em.findOne(Clip, { id }, { populate: ['visit.athlete'] }),
    );
    if (!clip) throw new Problem('upload-gone');
    needCaseload(actor, 'clip.upload', clip.visit.unwrap().athlete.unwrap());
    res.set({
      'Tus-Resumable': '1.0.0',
      'Upload-Offset': String(clip.bytes),
      'Upload-Length': String(clip.bytes),
    });
    res.status(res.req.method === 'HEAD' ? 200 : 204).end();
  };

  const receive: RequestHandler = async (req, res) => {
    const { actor } = staffOf(res);
    const id = String(req.params.id);
    if (!UUID.test(id)) throw new Problem('upload-gone');
    if (!(await isUnderWay(actor, id))) {
      await answerDone(actor, id, res);
      return;
    }
    senders.set(id, actor);
    res.once('close', () => senders.delete(id));
    await tus.handle(req, res);
  };
  router.head(`${UPLOADS}/:id`, sessions.whoIs, receive);
  router.patch(`${UPLOADS}/:id`, sessions.whoIs, receive);

  serve(routes.openUpload, async ({ params, body, work }) => {
    needSize(body.bytes);
    const { bytes, view, supportSide, mirrored } = body;
    const name = shownName(body.name);
    cameraOf({ name, view, supportSide, mirrored });
    const upload = await work(async (unit) => {
      const { visit } = await needUploadAllowed(unit, params.id);
      await needQuota(unit, bytes);
      return openUpload(unit, visit, { name, bytes, view, supportSide, mirrored });
    });
    await store.create(new TusUpload({ id: upload.id, size: bytes, offset: 0 }));
    return { id: upload.id, uploadUrl: `${UPLOADS}/${upload.id}`, bytes, received: 0 };
  });

  serve(routes.cancelUpload, async ({ params, work }) => {
    const { id, practiceId } = await work((unit) => uploadInSight(unit, params.id));
    await giveUpUpload(ground, practiceId, id);
  });
};
