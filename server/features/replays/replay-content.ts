import type { EntityManager } from '@mikro-orm/postgresql';
import { readingLabel } from '#shared/contracts/readings.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { viewOf } from '#shared/records/views.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Call } from '../calls/call.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { Comment } from '../comments/comment.entity.ts';
import { COMMENT_ORDER } from '../comments/comments.presenter.ts';
import { athletePlanOf } from '../plans/athlete-answers.ts';
import { Practice } from '../practice/practice.entity.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { plusMinus } from '../readings/plus-minus.ts';
import { resultOf } from '../readings/result-of.ts';
import type { Reading } from '../readings/reading.entity.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { storedReps } from '../reps/stored-reps.ts';
import { earlierLiftOf } from './before/earlier-lift.ts';
import { publicHeadState } from './hidden-copies.ts';
import type { Replay } from './replay.entity.ts';
import { type Span, spanOf } from './span.ts';

interface Held {
  readonly em: EntityManager;
}

/** Reps whose own change goes the way of the reading. */
const agreeing = ({ code, reps }: ReadingResult): number => {
  const goesWith: Partial<Record<ReadingResult['code'], (change: number) => boolean>> = {
    'early-turn-out': (change) => change > 0,
    'expected-turn-in': (change) => change < 0,
    'holds-still': (change) => Math.abs(change) < 5,
  };
  const test = goesWith[code];
  return test ? reps.filter(({ used, fit }) => used && fit && test(fit.change.value)).length : 0;
};

const probabilityOf = ({ code, figures }: ReadingResult): number | null => {
  if (!figures) return null;
  switch (code) {
    case 'early-turn-out':
      return Math.max(figures.pEarly, figures.pBefore60);
    case 'expected-turn-in':
      return figures.pIn;
    case 'holds-still':
      return figures.pFlat;
    default:
      return null;
  }
};

/** Null where it is not shown, or not final yet; the link shows it by itself once it is. */
const readingOf = (reading: Reading | null, replay: Replay): PublicReplay['reading'] => {
  if (!replay.showReading) return null;
  const stored = reading?.result.unwrap();
  const result = stored && resultOf(stored);
  // what still rests on marks that nobody has looked at is not told to the athlete
  if (!reading || !result || reading.provisional) return null;
  return {
    code: reading.code,
    label: readingLabel(reading.code, reading.before60, reading.gateFrom),
    change: reading.change ?? null,
    plusMinus: plusMinus(reading.u),
    probability: probabilityOf(result),
    repsUsed: result.reps.filter(({ used }) => used).length,
    repsAgreeing: agreeing(result),
  };
};

/** The reading of the side that is played and what its coach first saw, each with its gates. */
const saidOf = async ({ em }: Held, replay: Replay) => {
  const which = { visit: replay.visit.id, side: replay.side };
  const setting = await em.findOne(SideSetting, which, { populate: ['reading.result'] });
  const reading = setting?.reading?.unwrap() ?? null;
  const call = await em.findOne(Call, which, { orderBy: { at: 'asc', id: 'asc' } });
  const { gateFrom, gateTo } = reading ?? call ?? (await currentProtocol(em)).values;
  return { reading, call, gates: { from: degrees(gateFrom), to: degrees(gateTo) } };
};

const sharedComments = async (
  { em }: Held,
  clip: Clip,
  { fromFrame, toFrame }: Replay,
  measured: Span['measured'],
): Promise<PublicReplay['comments']> => {
  const comments = await em.find(
    Comment,
    { clip: clip.id, shared: true, fromFrame: { $lte: toFrame }, toFrame: { $gte: fromFrame } },
    { populate: ['by'], orderBy: COMMENT_ORDER },
  );
  return comments.map((comment) => ({
    body: comment.body,
    fromFrame: comment.fromFrame,
    toFrame: comment.toFrame,
    shape:
      comment.shape?.kind === 'measure'
        ? measured(comment.shape.measure, comment.fromFrame)
        : (comment.shape ?? null),
    by: comment.by.unwrap().name,
  }));
};

/** What is loaded with a replay that is to be told. */
export const PLAYED = ['rep.clip.frames', 'visit.athlete', 'visit.coach'] as const;

/** A link's replay with what it plays and whose it is, loaded with `PLAYED`. */
export interface Played {
  readonly replay: Replay;
  readonly rep: Rep;
  readonly clip: Clip;
}

/** All that a link shows, page and film alike. */
export const contentOf = async (
  unit: Held,
  { replay, rep, clip }: Played,
): Promise<Omit<PublicReplay, 'film'>> => {
  const { em } = unit;
  const { width, height } = clip;
  const frames = clip.frames.unwrap();
  if (!frames || !width || !height) throw new Problem('not-found');
  const visit = replay.visit.unwrap();
  const athlete = visit.athlete.unwrap() as Athlete;
  const practice = await em.findOneOrFail(Practice, { id: replay.practiceId });
  const { reading, call, gates } = await saidOf(unit, replay);
  const told = readingOf(reading, replay);
  // the clip's other reps too: it may take the quiet stance of one
  const reps = await storedReps(em, [clip], athlete);
  const stored = found(reps.find((each) => each.rep.id === rep.id));
  const span = { from: replay.fromFrame, to: replay.toFrame };
  const { measured, way, ...shown } = spanOf(stored, span, { figures: replay.showReading, gates });
  return {
    athleteGivenName: athlete.givenName,
    practice: { name: practice.name, contact: practice.contact },
    coachName: visit.coach.unwrap().name,
    visitDay: visit.day,
    side: replay.side,
    view: viewOf(clip.cameraStood, rep.supportSide),
    width,
    height,
    frames,
    head: await publicHeadState(em, replay, clip),
    fromFrame: replay.fromFrame,
    toFrame: replay.toFrame,
    gates,
    ...shown,
    before: await earlierLiftOf(em, replay, { athlete, way, gates, figures: told !== null }),
    reading: told,
    call: replay.showCall && call ? { seen: call.seen, confidence: call.confidence } : null,
    message: replay.message,
    plan: await athletePlanOf(em, visit.id, replay.side),
    comments: await sharedComments(unit, clip, replay, told ? measured : () => null),
    expiresAt: replay.expiresAt.toISOString(),
  };
};
