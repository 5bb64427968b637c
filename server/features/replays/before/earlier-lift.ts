import type { EntityManager } from '@mikro-orm/postgresql';
import type { EarlierLift, MatchedFrames } from '#shared/contracts/replay-parts.ts';
import { type LiftWay, matchLifts } from '#shared/course/match-lifts.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Athlete } from '../../athletes/athlete.entity.ts';
import type { Clip } from '../../clips/clip.entity.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import { storedReps } from '../../reps/stored-reps.ts';
import type { Visit } from '../../visits/visit.entity.ts';
import { publicHeadState } from '../hidden-copies.ts';
import { beforeOfLink } from '../link-files.ts';
import type { Replay } from '../replay.entity.ts';
import { spanOf } from '../span.ts';

const matchedFrames = (before: LiftWay, now: LiftWay, figures: boolean): MatchedFrames => {
  const moments = matchLifts(before, now);
  return {
    before: moments.map(({ first }) => first.frame),
    now: moments.map(({ second }) => second.frame),
    lift: moments.map(({ first, second }) =>
      figures ? Math.round(5 * (first.lift + second.lift)) / 10 : null,
    ),
    rising: moments.filter(({ part }) => part === 'rise').length,
  };
};

interface Beside {
  readonly athlete: Athlete;
  readonly way: LiftWay;
  readonly gates: Gates;
  /** False leaves every angle out, of both. */
  readonly figures: boolean;
}

/** What a link shows of the earlier lift; null where there is none, or the two share no lift any more. */
export const earlierLiftOf = async (
  em: EntityManager,
  replay: Replay,
  { athlete, way, gates, figures }: Beside,
): Promise<EarlierLift | null> => {
  const before = await beforeOfLink(em, replay);
  if (!before) return null;
  const rep = before.rep.unwrap() as Rep;
  const clip = rep.clip.unwrap() as Clip;
  const { width, height } = clip;
  const frames = clip.frames.unwrap();
  if (!frames || !width || !height) return null;
  const reps = await storedReps(em, [clip], athlete);
  const stored = reps.find((each) => each.rep.id === rep.id);
  if (!stored) return null;
  const span = { from: before.fromFrame, to: before.toFrame };
  const { way: own, moments, overlay } = spanOf(stored, span, { figures, gates });
  const matched = matchedFrames(own, way, figures);
  if (matched.now.length === 0) return null;
  return {
    visitDay: (clip.visit.unwrap() as Visit).day,
    view: viewOf(clip.cameraStood, rep.supportSide),
    width,
    height,
    frames,
    head: await publicHeadState(em, before, clip),
    moments,
    overlay,
    matched,
  };
};
