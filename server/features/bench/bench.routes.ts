import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { benchOf } from './bench.service.ts';
import { sayHere } from './say-here.ts';

export const benchFeature: Feature = ({ serve }) => {
  serve(routes.bench, ({ params, work }) => work((unit) => benchOf(unit, params.id)));
  serve(routes.sayHere, ({ params, body, session, work }) =>
    work((unit) => sayHere(unit, params.id, session.user, body.here)),
  );
};
