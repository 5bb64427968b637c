import type { LinkActor } from '#shared/access/actors.ts';
import { readingLabel } from '#shared/contracts/readings.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Call } from '../calls/call.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { Comment } from '../comments/comment.entity.ts';
import { COMMENT_ORDER } from '../comments/comments.presenter.ts';
import { audit } from '../audit/audit.ts';
import { athletePlanOf } from '../plans/athlete-answers.ts';
import { Practice } from '../practice/practice.entity.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { plusMinus } from '../readings/plus-minus.ts';
import { resultOf } from '../readings/result-of.ts';
import type { Reading } from '../readings/reading.entity.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { storedReps } from '../reps/stored-reps.ts';
import { publicHeadState, servedHidden } from './hidden-copies.ts';
import { Replay } from './replay.entity.ts';
import { spanOf } from './span.ts';

type Of = Unit<LinkActor>;

/** The replay of this link with its rep, clip and people. */
export const replayOfLink = async ({ em, actor }: Of) => {
  need(actor, 'replay.open', {
    kind: 'replay',
    practiceId: actor.practiceId,
    replayId: actor.replayId,
  });
  const replay = found(
    await em.findOne(
      Replay,
      { id: actor.replayId },
      { populate: ['rep.clip.frames', 'visit.athlete', 'visit.coach'] },
    ),
  );
  const rep = replay.rep.unwrap() as Rep;
  return { replay, rep, clip: rep.clip.unwrap() as Clip };
};

/**
 * Where a picture of this link lies; null where it is not there.
 * @throws Problem 'clip-not-ready' until there is a copy on which the head is hidden as the link promises
 */
export const mediaOfLink = async (unit: Of, which: 'replay' | 'poster'): Promise<string | null> => {
  const { replay, clip } = await replayOfLink(unit);
  if (!replay.hideHead) return clip.files[which];
  const files = await servedHidden(unit.em, replay, clip);
  if (!files) throw new Problem('clip-not-ready', 'The film is being prepared.');
  return files[which];
};

/** Whether there is a film to play; opens nothing and is not counted. */
export const filmOfLink = async (unit: Of): Promise<Pick<PublicReplay, 'head'>> => {
  const { replay, clip } = await replayOfLink(unit);
  return { head: await publicHeadState(unit.em, replay, clip) };
};

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
const saidOf = async ({ em }: Of, replay: Replay) => {
  const which = { visit: replay.visit.id, side: replay.side };
  const setting = await em.findOne(SideSetting, which, { populate: ['reading.result'] });
  const reading = setting?.reading?.unwrap() ?? null;
  const call = await em.findOne(Call, which, { orderBy: { at: 'asc', id: 'asc' } });
  const { gateFrom, gateTo } = reading ?? call ?? (await currentProtocol(em)).values;
  return { reading, call, gates: { from: degrees(gateFrom), to: degrees(gateTo) } };
};

const sharedComments = async (
  { em }: Of,
  clip: Clip,
  { fromFrame, toFrame }: Replay,
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
    shape: comment.shape ?? null,
    by: comment.by.unwrap().name,
  }));
};

/** Everything that leaves by a link, and nothing else; each opening is counted and written down. */
export const openReplay = async (unit: Of): Promise<PublicReplay> => {
  const { em } = unit;
  const { replay, rep, clip } = await replayOfLink(unit);
  const { width, height } = clip;
  const frames = clip.frames.unwrap();
  if (!frames || !width || !height) throw new Problem('not-found');
  const visit = replay.visit.unwrap();
  const athlete = visit.athlete.unwrap() as Athlete;
  const practice = await em.findOneOrFail(Practice, { id: replay.practiceId });
  const { reading, call, gates } = await saidOf(unit, replay);
  // the clip's other reps too: it may take the quiet stance of one
  const reps = await storedReps(em, [clip], athlete);
  const stored = found(reps.find((each) => each.rep.id === rep.id));
  const head = await publicHeadState(em, replay, clip);
  const span = { from: replay.fromFrame, to: replay.toFrame };
  const shown = spanOf(stored, span, { figures: replay.showReading, gates });
  await em.execute(
    'update replay set openings = openings + 1, last_opened_at = now() where id = ?',
    [replay.id],
  );
  audit(unit, 'replay.open', replay.id, { athlete: athlete.id });
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
    head,
    fromFrame: replay.fromFrame,
    toFrame: replay.toFrame,
    gates,
    ...shown,
    reading: readingOf(reading, replay),
    call: replay.showCall && call ? { seen: call.seen, confidence: call.confidence } : null,
    message: replay.message,
    plan: await athletePlanOf(em, visit.id, replay.side),
    comments: await sharedComments(unit, clip, replay),
    expiresAt: replay.expiresAt.toISOString(),
  };
};

/** Writes down that somebody who has the link does not have its pass phrase. */
export const passPhraseWasWrong = async (unit: Of): Promise<void> => {
  const { em, actor } = unit;
  const replay = await em.findOneOrFail(Replay, { id: actor.replayId }, { populate: ['visit'] });
  audit(unit, 'replay.refused', replay.id, { athlete: replay.visit.unwrap().athlete.id });
};
