import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { renewReading, setAssumption, sideReading } from './readings.service.ts';

export const readingsFeature: Feature = ({ serve }) => {
  serve(routes.sideReading, ({ params, work }) =>
    work((unit) => sideReading(unit, params.id, params.side)),
  );

  serve(routes.renewReading, ({ params, work }) =>
    work((unit) => renewReading(unit, params.id, params.side)),
  );

  serve(routes.setAssumption, ({ params, body, work }) =>
    work((unit) => setAssumption(unit, params.id, params.side, body.on)),
  );
};
