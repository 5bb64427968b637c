import { routes } from '#shared/contracts/routes.ts';
import { letterLimits, mailLinkLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { presentMe } from '../accounts/accounts.presenter.ts';
import { enter } from '../accounts/enter.ts';
import { askMailLink } from './ask-mail-link.ts';
import { confirmEmail } from './confirm-email.ts';
import { liveMailLink } from './live-mail-link.ts';
import { presentMailLink } from './mail-links.presenter.ts';
import { join, resetPassword } from './mail-links.service.ts';

export const mailLinksFeature: Feature = ({ serve, ground }) => {
  const tries = mailLinkLimits();

  serve(routes.forgot, ({ body }) => askMailLink(ground, 'reset', body), ...letterLimits());

  serve(
    routes.startPractice,
    ({ body: { email, name, practiceName } }) =>
      askMailLink(ground, 'start', { email, person: name, practice: practiceName }),
    ...letterLimits(),
  );

  serve(
    routes.lookAtMailLink,
    async ({ body }) => presentMailLink(await liveMailLink(ground, body.token)),
    ...tries,
  );

  serve(
    routes.join,
    async ({ body, req, res }) => {
      const session = await join(ground, body, req.get('user-agent'));
      await enter(ground, req, res, session);
      return presentMe(session);
    },
    ...tries,
  );

  serve(routes.resetPassword, ({ body }) => resetPassword(ground, body), ...tries);

  serve(routes.confirmEmail, ({ body }) => confirmEmail(ground, body.token), ...tries);
};
