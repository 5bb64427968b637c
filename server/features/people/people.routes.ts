import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { invite, peoplePage, withdrawInvitation } from './people.service.ts';

export const peopleFeature: Feature = ({ serve }) => {
  serve(routes.people, ({ work }) => work(peoplePage));

  serve(routes.invite, ({ body, work }) => work((unit) => invite(unit, body)));

  serve(routes.withdrawInvitation, ({ params, work }) =>
    work((unit) => withdrawInvitation(unit, params.id)),
  );
};
