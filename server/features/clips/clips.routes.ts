import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { clipInSight, frameCountOf } from './clip-in-sight.ts';
import { clipPrefix } from './clip-files.ts';
import { listClips } from './clip-list.ts';
import { fullFrame, sheet } from './clip-pictures.ts';
import { presentClip, presentClipWithFrames } from './clips.presenter.ts';
import {
  countReps,
  deleteClip,
  editClip,
  lookAtClip,
  prepareAgain,
  usePart,
} from './clips.service.ts';
import { Problem } from '../../http/problem.ts';
import { sendStored } from './send-stored.ts';

const COPIES = {
  clipVideo: ['bench', 'video/mp4'],
  clipPoster: ['poster', 'image/jpeg'],
  clipStrip: ['strip', 'image/jpeg'],
} as const;

export const clipsFeature: Feature = ({ serve, ground: { storage } }) => {
  serve(routes.listClips, ({ query, work }) => work((unit) => listClips(unit, query)));

  serve(routes.clip, ({ params, work }) =>
    work(async (unit) => {
      const { clip } = await clipInSight(unit, params.id, 'athlete.read', { frames: true });
      return presentClipWithFrames(clip, await countReps(unit, clip.id));
    }),
  );

  serve(routes.editClip, ({ params, body, work }) =>
    work(async (unit) =>
      presentClip(await editClip(unit, params.id, body), await countReps(unit, params.id)),
    ),
  );

  serve(routes.usePart, ({ params, body, work }) =>
    work(async (unit) => presentClip(await usePart(unit, params.id, body), 0)),
  );

  serve(routes.prepareAgain, ({ params, work }) =>
    work(async (unit) =>
      presentClip(await prepareAgain(unit, params.id), await countReps(unit, params.id)),
    ),
  );

  serve(routes.deleteClip, async ({ params, work, actor }) => {
    await work((unit) => deleteClip(unit, params.id));
    await storage.deleteAll(clipPrefix(actor.practiceId, params.id));
  });

  for (const name of ['clipVideo', 'clipPoster', 'clipStrip'] as const) {
    const [copy, type] = COPIES[name];
    serve(routes[name], async ({ params, work, req, res }) => {
      // posters and strips stand in lists and beside the clip: they are no look at it
      const clip = await work(async (unit) =>
        name === 'clipVideo'
          ? lookAtClip(unit, params.id)
          : (await clipInSight(unit, params.id, 'athlete.read')).clip,
      );
      frameCountOf(clip);
      const key = clip.files[copy];
      if (!key) throw new Problem('clip-not-ready');
      await sendStored(req, res, storage, key, type);
    });
  }

  for (const [name, make] of [
    ['clipFrame', fullFrame],
    ['clipSheet', sheet],
  ] as const) {
    serve(routes[name], async ({ params, work, req, res }) => {
      const clip = await work((unit) => lookAtClip(unit, params.id, { frames: true }));
      const key = await make(storage, clip, params.index);
      await sendStored(req, res, storage, key, 'image/jpeg');
    });
  }
};
