import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { presentCall } from './calls.presenter.ts';
import { listCalls, recordCall } from './calls.service.ts';

export const callsFeature: Feature = ({ serve }) => {
  serve(routes.listCalls, async ({ work, params }) => ({
    items: (await work((unit) => listCalls(unit, params.id, params.side))).map(presentCall),
  }));
  serve(routes.recordCall, async ({ work, params, body }) =>
    presentCall(await work((unit) => recordCall(unit, params.id, params.side, body))),
  );
};
