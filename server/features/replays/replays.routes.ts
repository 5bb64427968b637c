import type { Request } from 'express';
import { routes } from '#shared/contracts/routes.ts';
import { passPhraseLimits } from '../../http/rate-limit.ts';
import { Problem } from '../../http/problem.ts';
import type { Feature } from '../../main/feature.ts';
import { passwordFits } from '../accounts/password.ts';
import { sendStored } from '../clips/send-stored.ts';
import { liveLink, needUnlocked, unlock } from './link.ts';
import { openReplay, replayOfLink } from './public-replay.ts';
import { presentReplay } from './replays.presenter.ts';
import { hashOf, listReplays, makeReplay, revokeReplay } from './replays.service.ts';

const MEDIA = {
  replayVideo: ['replay', 'video/mp4'],
  replayPoster: ['poster', 'image/jpeg'],
} as const;

export const replaysFeature: Feature = ({ serve, ground }) => {
  const { inPractice, storage, config } = ground;

  serve(routes.listReplays, ({ query, work }) =>
    work(async (unit) => ({
      items: (await listReplays(unit, query)).map(presentReplay),
    })),
  );

  serve(routes.makeReplay, async ({ body, work }) => {
    const passPhraseHash = await hashOf(body.passPhrase);
    const { replay, token } = await work((unit) => makeReplay(unit, body, passPhraseHash));
    return { replay: presentReplay(replay), url: `${config.publicUrl}/r/${token}` };
  });

  serve(routes.revokeReplay, ({ params, work }) =>
    work(async (unit) => presentReplay(await revokeReplay(unit, params.id))),
  );

  /** The link's actor, where it is live and unlocked on this device. */
  const actorOf = async (req: Request, token: string) => {
    const link = await liveLink(ground, token);
    needUnlocked(req, token, link);
    return link.actor;
  };

  serve(routes.openReplay, async ({ params, req }) =>
    inPractice(await actorOf(req, params.token), openReplay),
  );

  serve(
    routes.unlockReplay,
    async ({ params, body, res }) => {
      const { passPhraseHash } = await liveLink(ground, params.token);
      if (passPhraseHash === null) return;
      if (!(await passwordFits(body.passPhrase, passPhraseHash)))
        throw new Problem('pass-phrase-needed', 'This is not the pass phrase.');
      unlock(res, params.token, passPhraseHash, config.publicUrl.startsWith('https:'));
    },
    ...passPhraseLimits(),
  );

  for (const name of ['replayVideo', 'replayPoster'] as const) {
    const [copy, type] = MEDIA[name];
    serve(routes[name], async ({ params, req, res }) => {
      const { clip } = await inPractice(await actorOf(req, params.token), replayOfLink);
      const key = clip.files[copy];
      if (!key) throw new Problem('not-found');
      await sendStored(req, res, storage, key, type, 'link');
    });
  }
};
