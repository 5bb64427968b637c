import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { readToday } from './today.service.ts';

export const todayFeature: Feature = ({ serve }) => {
  serve(routes.today, ({ work }) => work(readToday));
};
