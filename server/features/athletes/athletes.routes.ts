import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { listAthletes } from './athlete-list.ts';
import { presentAthlete, presentAthletes, presentConsent } from './athletes.presenter.ts';
import { addAthlete, editAthlete, readAthlete } from './athletes.service.ts';
import { listConsents, recordConsent } from './consents.service.ts';
import { withdrawConsent, withdrawPurposes } from './withdraw.ts';

export const athletesFeature: Feature = ({ serve }) => {
  serve(routes.listAthletes, async ({ work, query }) =>
    presentAthletes(await work((unit) => listAthletes(unit, query))),
  );
  serve(routes.addAthlete, async ({ work, body }) =>
    presentAthlete(await work((unit) => addAthlete(unit, body))),
  );
  serve(routes.athlete, async ({ work, params }) =>
    presentAthlete(await work((unit) => readAthlete(unit, params.id))),
  );
  serve(routes.editAthlete, async ({ work, params, body }) =>
    presentAthlete(await work((unit) => editAthlete(unit, params.id, body))),
  );
  serve(routes.listConsents, async ({ work, params }) => ({
    items: (await work((unit) => listConsents(unit, params.id))).map(presentConsent),
  }));
  serve(routes.recordConsent, async ({ work, params, body }) =>
    presentConsent(await work((unit) => recordConsent(unit, params.id, body))),
  );
  serve(routes.withdrawConsent, async ({ work, params }) =>
    presentConsent(await work((unit) => withdrawConsent(unit, params.id))),
  );
  serve(routes.withdrawPurposes, async ({ work, params, body }) =>
    presentAthlete(await work((unit) => withdrawPurposes(unit, params.id, body.purposes))),
  );
};
