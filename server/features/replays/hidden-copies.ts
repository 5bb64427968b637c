import type { EntityManager } from '@mikro-orm/postgresql';
import type { PublicReplay, Replay as ReplayShape } from '#shared/contracts/replays.ts';
import { type Stretch, uncovered } from '#shared/head/heads.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { hiddenFiles } from '../clips/clip-files.ts';
import { currentHead, headTrack } from '../heads/current-head.ts';
import { Head } from '../heads/head.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { ReplayBefore } from './before/replay-before.entity.ts';
import { HIDE_HEAD } from './jobs/hide-head-type.ts';
import { Replay } from './replay.entity.ts';

/** One film of a link: that of its own rep, or the earlier one beside it. */
export type LinkFilm = Replay | ReplayBefore;

const named = (stretches: readonly Stretch[]): string =>
  stretches.map(({ from, to }) => (from === to ? `${from}` : `${from} to ${to}`)).join(', ');

const WHERE = 'Open the clip on the Bench and choose ‘Hide the head’';

/**
 * What a replay may be made by: a box on every frame of the span, and a person who has looked.
 * @throws Problem 'head-not-covered' or 'head-not-looked-at'
 */
export const needHiddenHead = async (
  em: EntityManager,
  clip: Clip,
  span: Stretch,
): Promise<Head> => {
  const head = await currentHead(em, clip.id);
  if (!head)
    throw new Problem(
      'head-not-covered',
      `No box is drawn around the head in this clip yet. ${WHERE}, then draw it on one frame.`,
    );
  const bare = uncovered(headTrack(head, clip), span);
  if (bare.length > 0)
    throw new Problem(
      'head-not-covered',
      `The head is not covered on frames ${named(bare)}. ${WHERE}, then follow the box through the whole clip, or choose other frames.`,
    );
  if (!head.lookedAt)
    throw new Problem(
      'head-not-looked-at',
      `Nobody has looked yet whether the box covers the head. ${WHERE}, look through it and confirm.`,
    );
  return head;
};

/** The same for a film that is there: null while nothing may be shown by it. */
export const headOfReplay = async (
  em: EntityManager,
  { fromFrame, toFrame }: LinkFilm,
  clip: Clip,
): Promise<Head | null> => {
  const head = await currentHead(em, clip.id);
  if (!head?.lookedAt) return null;
  const span = { from: fromFrame, to: toFrame };
  return uncovered(headTrack(head, clip), span).length === 0 ? head : null;
};

/** How the head of a film stands. A copy that was made by another version of the box counts for nothing. */
export const headStateOf = async (
  em: EntityManager,
  film: LinkFilm,
  clip: Clip,
): Promise<ReplayShape['head']> => {
  if (!film.hideHead) return 'shown';
  const head = await headOfReplay(em, film, clip);
  if (!head) return 'to-be-looked-at';
  if (film.hiddenHead?.id === head.id) return 'hidden';
  return film.hideFailed ? 'failed' : 'being-prepared';
};

/** The same for who holds the link: why there is no film yet is the practice's affair. */
export const publicHeadState = async (
  ...[em, film, clip]: Parameters<typeof headStateOf>
): Promise<PublicReplay['head']> => {
  const state = await headStateOf(em, film, clip);
  return state === 'to-be-looked-at' ? 'being-prepared' : state;
};

/** It opens nothing any more, for good. */
export const hasEnded = ({ revokedAt, expiresAt }: Replay): boolean =>
  Boolean(revokedAt) || expiresAt.getTime() <= Date.now();

/** Where the copy that may be served lies; null until there is one. */
export const servedHidden = async (
  em: EntityManager,
  film: LinkFilm,
  clip: Clip,
): Promise<ReturnType<typeof hiddenFiles> | null> => {
  const { hiddenHead } = film;
  if (!hiddenHead || (await headStateOf(em, film, clip)) !== 'hidden') return null;
  return hiddenFiles(film.practiceId, clip.id, film.id, hiddenHead.id);
};

/**
 * What may lie there for this film alone, by whichever version of the box: a worker that was killed leaves what
 * no row names.
 * @param film with its rep loaded
 */
export const hiddenFilesOf = async (
  em: EntityManager,
  { id, practiceId, rep, hideHead }: LinkFilm,
): Promise<string[]> => {
  if (!hideHead) return [];
  const { clip } = rep.unwrap() as Rep;
  const heads = await em.find(Head, { clip: clip.id }, { fields: ['id'] });
  return heads.flatMap((head) => Object.values(hiddenFiles(practiceId, clip.id, id, head.id)));
};

/** Asks for the copy, as if it had never been tried. */
export const askForCopy = async (
  unit: { readonly em: EntityManager },
  film: LinkFilm,
): Promise<void> => {
  film.hideTries = 0;
  film.hideFailed = false;
  await enqueue(unit, HIDE_HEAD, { replayId: film.id });
};

/** Makes the copies of a clip that links show anew, after somebody looked at another box. */
export const hiddenReplaysAreStale = async (
  unit: { readonly em: EntityManager },
  clipId: string,
): Promise<void> => {
  const live = { revokedAt: null, expiresAt: { $gt: new Date() } };
  const hidden = { rep: { clip: clipId }, hideHead: true };
  const films: LinkFilm[] = [
    ...(await unit.em.find(Replay, { ...hidden, ...live })),
    ...(await unit.em.find(ReplayBefore, { ...hidden, replay: live })),
  ];
  for (const film of films) await askForCopy(unit, film);
};
