import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { changePerson } from './change-person.ts';
import { deactivate, reactivate } from './deactivate.ts';
import { handOver } from './hand-over.ts';
import { invite, peoplePage, withdrawInvitation } from './people.service.ts';
import { resetCodes } from './reset-codes.ts';

export const peopleFeature: Feature = ({ serve }) => {
  serve(routes.people, ({ work }) => work(peoplePage));

  serve(routes.invite, ({ body, work }) => work((unit) => invite(unit, body)));

  serve(routes.withdrawInvitation, ({ params, work }) =>
    work((unit) => withdrawInvitation(unit, params.id)),
  );

  serve(routes.changePerson, ({ params, body, work }) =>
    work((unit) => changePerson(unit, params.id, body)),
  );

  serve(routes.deactivatePerson, ({ params, work }) => work((unit) => deactivate(unit, params.id)));

  serve(routes.resetCodes, ({ params, work }) => work((unit) => resetCodes(unit, params.id)));

  serve(routes.reactivatePerson, ({ params, work }) => work((unit) => reactivate(unit, params.id)));

  serve(routes.handOver, ({ params, body, work }) =>
    work((unit) => handOver(unit, params.id, body)),
  );
};
