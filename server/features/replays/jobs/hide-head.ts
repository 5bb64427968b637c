import { headsOf } from '#shared/head/heads.ts';
import { hideHead } from '#server/media/hide-head.ts';
import { product } from '../../../db/in-practice.ts';
import { handles, type JobContext } from '../../../jobs/job.ts';
import type { Ground } from '../../../main/ground.ts';
import type { Clip } from '../../clips/clip.entity.ts';
import { hiddenFiles } from '../../clips/clip-files.ts';
import { lockClip } from '../../clips/jobs/lock-clip.ts';
import { headTrack } from '../../heads/current-head.ts';
import { Head } from '../../heads/head.entity.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import { filmIsStale } from '../film/film-state.ts';
import { hasEnded, headOfReplay } from '../hidden-copies.ts';
import { filmById } from './film-by-id.ts';
import { HIDE_HEAD } from './hide-head-type.ts';
import { beginTry, endedBadly } from './hide-head-tries.ts';

/** The film and the box to make it by; null where nothing is to be made. */
const wanted = (ground: Ground, practiceId: string, replayId: string) =>
  ground.inPractice(product(practiceId), async ({ em }) => {
    const found = await filmById(em, replayId);
    if (!found?.film.hideHead || hasEnded(found.link)) return null;
    const { film } = found;
    const clip = (film.rep.unwrap() as Rep).clip.unwrap() as Clip;
    await lockClip(em, clip.id);
    const head = await headOfReplay(em, film, clip);
    if (!head || film.hiddenHead?.id === head.id) return null;
    return beginTry(film) ? { film, clip, head } : null;
  });

type Wanted = NonNullable<Awaited<ReturnType<typeof wanted>>>;

const requestOf = ({ film, clip, head }: Wanted) => {
  const frames = clip.frames.unwrap();
  const { width, height, copies, frameRate } = clip;
  const { bench } = clip.files;
  if (!frames || !width || !height || !copies || !bench)
    throw new Error('A clip that has a box was prepared.');
  const { timeBase, ticks } = frames;
  return {
    bench,
    source: { width, height },
    size: { width: copies.replay.width, height: copies.replay.height },
    perSecond: frameRate?.perSecond ?? 30,
    frames: { timeBase, ticks, us: [] },
    from: film.fromFrame,
    to: film.toFrame,
    heads: headsOf(headTrack(head, clip)),
  };
};

/** Says that the copy is there, unless the box was changed or the link ended meanwhile. */
const keep = (ground: Ground, { film: { id, practiceId }, clip, head }: Wanted) =>
  ground.inPractice(product(practiceId), async ({ em }) => {
    await lockClip(em, clip.id);
    const found = await filmById(em, id);
    if (!found || hasEnded(found.link)) return { kept: false, before: null };
    const { film } = found;
    if ((await headOfReplay(em, film, clip))?.id !== head.id) return { kept: false, before: null };
    const before = film.hiddenHead?.id ?? null;
    film.hiddenHead = em.getReference(Head, head.id, { wrapped: true });
    await filmIsStale({ em }, id);
    return { kept: true, before };
  });

/** Makes the copy and puts it where it is served from. */
const make = async (
  ground: Ground,
  asked: Wanted,
  filesBy: (headId: string) => ReturnType<typeof hiddenFiles>,
  signal: AbortSignal,
): Promise<void> => {
  const { storage } = ground;
  const { bench, ...request } = requestOf(asked);
  const files = filesBy(asked.head.id);
  await storage.withTempDir(async (folder) => {
    const made = await storage.withLocalFile(bench, (benchCopy) =>
      hideHead({ ...request, benchCopy, folder, signal }),
    );
    await storage.putFile(files.replay, made.video, 'video/mp4');
    await storage.putFile(files.poster, made.poster, 'image/jpeg');
  });
  const { kept, before } = await keep(ground, asked);
  const old = kept ? before : asked.head.id;
  if (old === null) return;
  for (const key of Object.values(filesBy(old))) await storage.delete(key);
};

/**
 * Killed at any instant it leaves at most a file that no row names; run again it makes the copy anew. What fails
 * again and again is given up, and the link says so.
 */
const run = async ({
  ground,
  practiceId,
  payload: { replayId },
  signal,
}: JobContext<{ replayId: string }>): Promise<void> => {
  const asked = await wanted(ground, practiceId, replayId);
  if (!asked) return;
  const filesBy = (headId: string) => hiddenFiles(practiceId, asked.clip.id, replayId, headId);
  try {
    await make(ground, asked, filesBy, signal);
  } catch (error) {
    if (await endedBadly(ground, asked.film, signal)) {
      ground.log.error({ err: error, replayId }, 'a head could not be hidden');
      return;
    }
    throw error;
  }
};

export const hideHeadJob = handles({
  type: HIDE_HEAD,
  lockKey: ({ replayId }) => replayId,
  run,
  expireInMinutes: 60,
  retryLimit: 5,
  retryDelaySeconds: 30,
  unfinished: {
    sql: 'select replay_id, practice_id from heads_to_hide()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { replayId: String(row.replay_id) },
    }),
  },
});
