import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { clipsOfVisit } from './clips-of-visit.ts';
import { addSetUp, deleteSetUp, listSetUps } from './set-ups.service.ts';
import { listVisits } from './visit-history.ts';
import { presentSetUp, presentVisit, presentVisitRow } from './visits.presenter.ts';
import { addVisit, answerSafety, editVisit, readVisit } from './visits.service.ts';

export const visitsFeature: Feature = ({ serve }) => {
  serve(routes.listVisits, async ({ work, params }) => ({
    items: (await work((unit) => listVisits(unit, params.id))).map(presentVisitRow),
  }));
  serve(routes.addVisit, async ({ work, params, body }) =>
    presentVisit(await work((unit) => addVisit(unit, params.id, body))),
  );
  serve(routes.visit, ({ work, params }) =>
    work(async (unit) => ({
      visit: presentVisit(await readVisit(unit, params.id)),
      clips: await clipsOfVisit(unit, params.id),
    })),
  );
  serve(routes.editVisit, async ({ work, params, body }) =>
    presentVisit(await work((unit) => editVisit(unit, params.id, body))),
  );
  serve(routes.answerSafety, async ({ work, params, body }) =>
    presentVisit(await work((unit) => answerSafety(unit, params.id, body))),
  );
  serve(routes.listSetUps, async ({ work }) => ({
    items: (await work(listSetUps)).map(presentSetUp),
  }));
  serve(routes.addSetUp, async ({ work, body }) =>
    presentSetUp(await work((unit) => addSetUp(unit, body))),
  );
  serve(routes.deleteSetUp, ({ work, params }) => work((unit) => deleteSetUp(unit, params.id)));
};
