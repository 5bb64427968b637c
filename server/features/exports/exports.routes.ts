import type { UserActor } from '#shared/access/actors.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { Unit } from '#server/db/in-practice.ts';
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

type FileRoute = (typeof routes)[
  'repFrames' | 'visitFrames' | 'repAnnotations' | 'visitAnnotations' | 'clipComments'];

export const exportsFeature: Feature = ({ serve, ground: { config } }) => {
  const limits = exportLimits(200);
  const offer = (
    route: FileRoute,
    type: string,
    make: (unit: Unit<UserActor>, id: string) => Promise<ExportedFile>,
  ): void =>
    serve(
      route,
      async ({ params, work, res }) => {
        const { name, text } = await work((unit) => make(unit, params.id));
        res.attachment(name).type(type).send(text);
      },
      ...limits,
    );

  offer(routes.repFrames, 'text/csv', framesOfRep);
  offer(routes.visitFrames, 'text/csv', framesOfVisit);
  offer(routes.repAnnotations, 'application/ld+json', (unit, id) =>
    annotationsOfRep(unit, id, config),
  );
  offer(routes.visitAnnotations, 'application/ld+json', (unit, id) =>
    annotationsOfVisit(unit, id, config),
  );
  offer(routes.clipComments, 'text/vtt', commentTrack);
};
