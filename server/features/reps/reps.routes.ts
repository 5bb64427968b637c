import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { presentMark } from '../marks/mark-store.ts';
import { marksOfRep, saveMarks } from '../marks/marks.service.ts';
import { presentOutcome } from '../marks/marks.presenter.ts';
import { addRep, deleteRep, editRep, presentStored, repsOfClip } from './reps.service.ts';
import { presentNumbered } from './stored-reps.ts';

export const repsFeature: Feature = ({ serve }) => {
  serve(routes.listReps, ({ params, work }) =>
    work(async (unit) => ({
      items: (await repsOfClip(unit, params.id)).map(presentNumbered),
    })),
  );

  serve(routes.addRep, ({ params, body, work }) => work((unit) => addRep(unit, params.id, body)));

  serve(routes.editRep, ({ params, body, work }) => work((unit) => editRep(unit, params.id, body)));

  serve(routes.deleteRep, ({ params, work }) => work((unit) => deleteRep(unit, params.id)));

  serve(routes.listMarks, ({ params, work }) =>
    work(async (unit) => ({ items: (await marksOfRep(unit, params.id)).map(presentMark) })),
  );

  serve(routes.saveMarks, ({ params, body, work }) =>
    work(async (unit) => {
      const { sight, outcomes } = await saveMarks(unit, params.id, body.commands);
      return {
        outcomes: outcomes.map(presentOutcome),
        rep: await presentStored(unit, sight, params.id),
      };
    }),
  );
};
