import { mkdtemp, rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { RequestHandler } from 'express';
import multer from 'multer';
import { clipUploadFields } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { maxBytes } from '#server/media/limits.ts';
import type { Feature } from '../../main/feature.ts';
import { formFault } from '../../http/form-fault.ts';
import { parseFields } from '../../http/parse.ts';
import { Problem } from '../../http/problem.ts';
import { staffOf } from '../../http/session.ts';
import { acceptClip, shownName } from './accept-clip.ts';
import { clipInSight } from './clip-in-sight.ts';
import { presentClip } from './clips.presenter.ts';
import { giveUpUpload } from './give-up-upload.ts';
import { openUpload } from './open-upload.ts';
import { cameraOf, needQuota, needSize, needUploadAllowed } from './upload-gate.ts';

/** Where this request's file is written; removed when the request is over, however it ends. */
const ownFolder =
  (incoming: string): RequestHandler =>
  async (_req, res, next) => {
    const folder = await mkdtemp(join(incoming, 'form-'));
    res.locals.folder = folder;
    const remove = () => rm(folder, { recursive: true, force: true, maxRetries: 3 });
    // cut while the gate was asked: nobody is there to answer, and nothing would remove the folder later
    if (res.closed) {
      await remove();
      return;
    }
    res.once('close', () => void remove());
    next();
  };

const problemOf = (error: unknown): unknown => {
  if (!(error instanceof multer.MulterError)) return formFault(error);
  if (error.code === 'LIMIT_FILE_SIZE') return new Problem('body-too-large');
  return new Problem('invalid-input', undefined, [
    { path: `body.${error.field ?? 'clip'}`, message: 'Send one file, in the field ‘clip’.' },
  ]);
};

/** Reads the form: one file in the field `clip`, its other fields in any order. */
const readForm: RequestHandler = (req, res, next) => {
  if (!req.is('multipart/form-data'))
    throw new Problem('unsupported-media-type', 'Send the clip as multipart/form-data.');
  multer({
    storage: multer.diskStorage({
      destination: (_req, _file, done) => {
        done(null, String(res.locals.folder));
      },
      filename: (_req, _file, done) => {
        done(null, 'received');
      },
    }),
    limits: { fileSize: maxBytes, files: 1, fields: 10, fieldSize: 1000, parts: 11 },
    defParamCharset: 'utf8',
  }).single('clip')(req, res, (error: unknown) => {
    if (error) next(problemOf(error));
    else next();
  });
};

/** Clips as a form, for scripts. Who asks, consent and safety are settled before the body is read. */
export const formUploadFeature: Feature = ({ serve, ground }) => {
  const gate: RequestHandler = async (req, res, next) => {
    const bytes = Number(req.headers['content-length'] ?? 0);
    needSize(bytes);
    await ground.inPractice(staffOf(res).actor, async (unit) => {
      await needUploadAllowed(unit, String(req.params.id));
      await needQuota(unit, bytes);
    });
    next();
  };

  serve(
    routes.uploadClip,
    async ({ params, req, actor, work }) => {
      const fields = parseFields(clipUploadFields, req.body ?? {});
      const { file } = req;
      if (!file)
        throw new Problem('invalid-input', undefined, [
          { path: 'body.clip', message: 'Send the clip in the field ‘clip’.' },
        ]);
      const facts = {
        name: shownName(file.originalname),
        bytes: file.size,
        view: fields.view,
        supportSide: fields.supportSide ?? null,
        mirrored: fields.mirrored,
      };
      cameraOf(facts);
      // a file that is in its place while nobody knows whether its clip was committed is still named by a row
      const { id } = await work(async (unit) => {
        const { visit } = await needUploadAllowed(unit, params.id);
        return openUpload(unit, visit, facts);
      });
      await acceptClip(ground, actor, params.id, { ...facts, path: file.path }, id).catch(
        async (error: unknown) => {
          await giveUpUpload(ground, actor.practiceId, id).catch((left: unknown) => {
            ground.log.warn({ err: left }, 'what is left of an upload is removed later');
          });
          throw error;
        },
      );
      return work(async (unit) =>
        presentClip((await clipInSight(unit, id, 'athlete.read')).clip, 0),
      );
    },
    gate,
    ownFolder(ground.storage.incoming),
    readForm,
  );
};
