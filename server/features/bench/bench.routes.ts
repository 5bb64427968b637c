import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { benchOf } from './bench.service.ts';

export const benchFeature: Feature = ({ serve }) => {
  serve(routes.bench, ({ params, work }) => work((unit) => benchOf(unit, params.id)));
};
