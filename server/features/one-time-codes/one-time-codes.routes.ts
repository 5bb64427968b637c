import { routes } from '#shared/contracts/routes.ts';
import { ownPasswordLimits, secondStepLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { presentMe } from '../accounts/accounts.presenter.ts';
import { enter } from '../accounts/enter.ts';
import { clearHalfSession, readHalfSession } from './half-session.ts';
import {
  confirmCodes,
  renewRecoveryCodes,
  startCodes,
  stopCodes,
} from './one-time-codes.service.ts';
import { signInWithCode } from './sign-in-code.ts';

export const oneTimeCodesFeature: Feature = ({ serve, ground }) => {
  const { sealer } = ground;
  const tries = ownPasswordLimits();

  serve(
    routes.signInCode,
    async ({ body, req, res }) => {
      const half = readHalfSession(req, ground);
      const session = await signInWithCode(ground, half, body.code, req.get('user-agent'));
      clearHalfSession(res, ground);
      await enter(ground, req, res, session);
      return presentMe(session);
    },
    ...secondStepLimits((req) => readHalfSession(req, ground)?.userId ?? null),
  );

  serve(routes.startCodes, ({ body, work }) => startCodes(work, sealer, body.password), ...tries);

  serve(
    routes.confirmCodes,
    ({ body, work, session }) => confirmCodes(work, sealer, body, session.id),
    ...tries,
  );

  serve(
    routes.renewRecoveryCodes,
    ({ body, work }) => renewRecoveryCodes(work, sealer, body),
    ...tries,
  );

  serve(routes.stopCodes, ({ body, work }) => stopCodes(work, sealer, body), ...tries);
};
