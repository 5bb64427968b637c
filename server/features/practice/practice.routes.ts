import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { changePractice, readPractice, setOwnersCode } from './practice.service.ts';

export const practiceFeature: Feature = ({ serve }) => {
  serve(routes.practice, ({ work }) => work((unit) => readPractice(unit)));

  serve(routes.changePractice, ({ body, work }) => work((unit) => changePractice(unit, body)));

  serve(routes.setOwnersCode, ({ body, work }) => work((unit) => setOwnersCode(unit, body.needed)));
};
