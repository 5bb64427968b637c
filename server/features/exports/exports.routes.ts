import type { Response } from 'express';
import { routes } from '#shared/contracts/routes.ts';
import { exportLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import {
  annotationsOfRep,
  annotationsOfVisit,
  commentTrack,
  type ExportedFile,
  framesOfRep,
  framesOfVisit,
} from './exports.service.ts';

const save = (res: Response, type: string, { name, text }: ExportedFile): void => {
  res.attachment(name).type(type).send(text);
};

export const exportsFeature: Feature = ({ serve, ground: { config } }) => {
  const limits = exportLimits(200);
  serve(
    routes.repFrames,
    async ({ params, work, res }) =>
      save(res, 'text/csv', await work((unit) => framesOfRep(unit, params.id))),
    ...limits,
  );
  serve(
    routes.visitFrames,
    async ({ params, work, res }) =>
      save(res, 'text/csv', await work((unit) => framesOfVisit(unit, params.id))),
    ...limits,
  );
  serve(
    routes.repAnnotations,
    async ({ params, work, res }) =>
      save(
        res,
        'application/ld+json',
        await work((unit) => annotationsOfRep(unit, params.id, config)),
      ),
    ...limits,
  );
  serve(
    routes.visitAnnotations,
    async ({ params, work, res }) =>
      save(
        res,
        'application/ld+json',
        await work((unit) => annotationsOfVisit(unit, params.id, config)),
      ),
    ...limits,
  );
  serve(
    routes.clipComments,
    async ({ params, work, res }) =>
      save(res, 'text/vtt', await work((unit) => commentTrack(unit, params.id))),
    ...limits,
  );
};
