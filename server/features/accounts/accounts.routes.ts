import { routes } from '#shared/contracts/routes.ts';
import { ownPasswordLimits, signInLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { setHalfSession } from '../one-time-codes/half-session.ts';
import { changeEmail, dropEmailChange } from './change-email.ts';
import { changeName, changePassword, ownAccount } from './own-account.ts';
import { presentMe, presentSession } from './accounts.presenter.ts';
import { enter } from './enter.ts';
import {
  endSession,
  openSessions,
  signIn,
  signOut,
  signOutEverywhere,
} from './accounts.service.ts';

export const accountsFeature: Feature = ({ serve, ground }) => {
  const { sessions, inPractice } = ground;

  serve(
    routes.signIn,
    async ({ body, req, res }) => {
      const signedIn = await signIn(ground, body, req.get('user-agent'));
      if ('half' in signedIn) {
        setHalfSession(res, ground, signedIn.half);
        return { codeNeeded: true } as const;
      }
      await enter(ground, req, res, signedIn.session);
      return presentMe(signedIn.session);
    },
    ...signInLimits(),
  );

  serve(routes.signOut, async ({ req, res }) => {
    const session = await sessions.find(req, res);
    if (session) await inPractice(session.actor, (unit) => signOut(unit, session.id));
    sessions.clearCookie(res);
  });

  serve(routes.signOutEverywhere, async ({ work, res }) => {
    await work(signOutEverywhere);
    sessions.clearCookie(res);
  });

  serve(routes.me, ({ session }) => presentMe(session));

  serve(routes.sessions, async ({ work, session }) => ({
    items: (await work(openSessions)).map((row) => presentSession(row, session.id)),
  }));

  serve(routes.endSession, ({ params, work }) => work((unit) => endSession(unit, params.id)));

  const tries = ownPasswordLimits();

  serve(routes.account, ({ work }) => work(ownAccount));

  serve(routes.changeName, ({ body, work }) => work((unit) => changeName(unit, body)));

  serve(
    routes.changePassword,
    ({ body, work, session }) => changePassword(work, body, session.id),
    ...tries,
  );

  serve(routes.changeEmail, ({ body, work }) => changeEmail(work, body), ...tries);

  serve(routes.dropEmailChange, ({ work }) => work(dropEmailChange));
};
