import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { chooseMail, ownChoices } from './mail-choices.ts';

export const waitingMailFeature: Feature = ({ serve }) => {
  serve(routes.waitingMail, ({ work }) => work(ownChoices));

  serve(routes.setWaitingMail, ({ body, work }) => work((unit) => chooseMail(unit, body)));
};
