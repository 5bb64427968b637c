import { routes } from '#shared/contracts/routes.ts';
import { linkLetterLimits, passPhraseLimits } from '../../http/rate-limit.ts';
import { Problem } from '../../http/problem.ts';
import type { Feature } from '../../main/feature.ts';
import { passwordFits } from '../accounts/password.ts';
import { sendStored } from '../clips/send-stored.ts';
import { linkActor, liveLink, unlock } from './link.ts';
import { filmOf } from './film/film-files.ts';
import { makeFilm, openFilm, takeFilm } from './film/kept-films.service.ts';
import { filesOfLink } from './link-files.ts';
import { filmOfLink, mediaOfLink, openReplay, passPhraseWasWrong } from './public-replay.ts';
import { presentReplay } from './replays.presenter.ts';
import {
  earlierOfLink,
  hashOf,
  headOfLink,
  hideHeadAgain,
  listReplays,
  makeReplay,
  revokeReplay,
} from './replays.service.ts';
import { sendNow, writeReplayLetter } from './send-replay.ts';

const MEDIA = {
  replayBeforeVideo: ['before', 'video/mp4'],
  replayVideo: ['replay', 'video/mp4'],
  replayPoster: ['poster', 'image/jpeg'],
} as const;

const presented = async (...[unit, replay]: Parameters<typeof headOfLink>) =>
  presentReplay(replay, {
    head: await headOfLink(unit, replay),
    before: await earlierOfLink(unit, replay),
    film: await filmOf(unit.em, replay),
  });

export const replaysFeature: Feature = ({ serve, ground }) => {
  const { inPractice, storage, config } = ground;

  serve(routes.listReplays, ({ query, work }) =>
    work(async (unit) => {
      const items = [];
      for (const replay of await listReplays(unit, query))
        items.push(await presented(unit, replay));
      return { items };
    }),
  );

  serve(routes.makeReplay, async ({ body, work }) => {
    const passPhraseHash = await hashOf(body.passPhrase);
    return work(async (unit) => {
      const { replay, token } = await makeReplay(unit, body, passPhraseHash);
      return { replay: await presented(unit, replay), url: `${config.publicUrl}/r/${token}` };
    });
  });

  serve(
    routes.sendReplay,
    async ({ params, body: { token, email }, work }) => {
      const home = config.publicUrl;
      const letter = await work((unit) => writeReplayLetter(unit, params.id, { token, home }));
      await sendNow(ground, email, letter);
    },
    ...linkLetterLimits(),
  );

  serve(routes.revokeReplay, async ({ params, work }) => {
    const { ended, files } = await work(async (unit) => {
      const replay = await revokeReplay(unit, params.id);
      return {
        ended: await presented(unit, replay),
        files: await filesOfLink(unit.em, replay),
      };
    });
    for (const key of files) await storage.delete(key);
    return ended;
  });

  serve(routes.hideHeadAgain, ({ params, work }) =>
    work(async (unit) => presented(unit, await hideHeadAgain(unit, params.id))),
  );

  serve(routes.makeFilm, ({ params, work }) =>
    work(async (unit) => presented(unit, await makeFilm(unit, params.id))),
  );

  serve(routes.keptFilm, async ({ params, work, req, res }) => {
    const { key, name } = await work((unit) => openFilm(unit, params.id));
    res.attachment(name);
    await sendStored(req, res, storage, key, 'video/mp4');
  });

  serve(routes.takeFilm, async ({ params, req, res }) => {
    const actor = await linkActor(ground, req, params.token);
    // a download that was cut off goes on where it stopped, and is the same download
    const begins = !/^bytes=[1-9]/.test(req.get('range') ?? '') && req.method !== 'HEAD';
    const { key, name } = await inPractice(actor, (unit) => takeFilm(unit, begins));
    res.attachment(name);
    await sendStored(req, res, storage, key, 'video/mp4');
  });

  serve(routes.openReplay, async ({ params, req }) =>
    inPractice(await linkActor(ground, req, params.token), openReplay),
  );

  serve(
    routes.unlockReplay,
    async ({ params, body, res }) => {
      const { actor, passPhraseHash } = await liveLink(ground, params.token);
      if (passPhraseHash === null) return;
      if (!(await passwordFits(body.passPhrase, passPhraseHash))) {
        await inPractice(actor, passPhraseWasWrong);
        throw new Problem('pass-phrase-needed', 'This is not the pass phrase.');
      }
      unlock(res, ground, params.token, passPhraseHash);
    },
    ...passPhraseLimits(),
  );

  serve(routes.replayFilm, async ({ params, req }) =>
    inPractice(await linkActor(ground, req, params.token), filmOfLink),
  );

  for (const name of ['replayVideo', 'replayPoster', 'replayBeforeVideo'] as const) {
    const [copy, type] = MEDIA[name];
    serve(routes[name], async ({ params, req, res }) => {
      const key = await inPractice(await linkActor(ground, req, params.token), (unit) =>
        mediaOfLink(unit, copy),
      );
      if (!key) throw new Problem('not-found');
      await sendStored(req, res, storage, key, type);
    });
  }
};
