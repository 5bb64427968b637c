import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { presentOutcome } from '../marks/marks.presenter.ts';
import { finishSecondMarking } from './finish-second-marking.ts';
import { reliabilityOf } from './reliability.service.ts';
import {
  discardSecondMarking,
  documentOf,
  saveSecondMarks,
  secondMarking,
  secondMarkingsOf,
} from './second-markings.service.ts';
import { startSecondMarking } from './start-second-marking.ts';

export const secondMarkingsFeature: Feature = ({ serve }) => {
  serve(routes.listSecondMarkings, ({ params, work }) =>
    work((unit) => secondMarkingsOf(unit, params.id)),
  );

  serve(routes.startSecondMarking, ({ params, body, work }) =>
    work((unit) => startSecondMarking(unit, params.id, body)),
  );

  serve(routes.secondMarking, ({ params, work }) => work((unit) => secondMarking(unit, params.id)));

  serve(routes.saveSecondMarks, ({ params, body, work }) =>
    work(async (unit) => {
      const { outcomes, summary } = await saveSecondMarks(unit, params.id, body.commands);
      return { outcomes: outcomes.map(presentOutcome), summary };
    }),
  );

  serve(routes.finishSecondMarking, ({ params, work }) =>
    work(async (unit) => documentOf(unit, await finishSecondMarking(unit, params.id))),
  );

  serve(routes.discardSecondMarking, ({ params, work }) =>
    work((unit) => discardSecondMarking(unit, params.id)),
  );

  serve(routes.reliability, ({ work }) => work(reliabilityOf));
};
