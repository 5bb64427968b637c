import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { Replay as ReplayShape, replayBody } from '#shared/contracts/replays.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import { newToken, tokenHash } from '../../http/token-hash.ts';
import { hashPassword } from '../accounts/password.ts';
import { User } from '../accounts/user.entity.ts';
import { athleteInSight } from '../athletes/athlete-in-sight.ts';
import { needConsent } from '../athletes/consent-check.ts';
import { Call } from '../calls/call.entity.ts';
import { needFrames } from '../clips/clip-in-sight.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { audit } from '../audit/audit.ts';
import { repInSight } from '../reps/rep-in-sight.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { visitInSight } from '../visits/visit-in-sight.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { chooseBefore, needBeforeHidden } from './before/choose-before.ts';
import { ReplayBefore } from './before/replay-before.entity.ts';
import { askForCopy, hasEnded, headStateOf, needHiddenHead } from './hidden-copies.ts';
import { REMOVE_HIDDEN } from './jobs/remove-hidden-type.ts';
import { beforeOfLink } from './link-files.ts';
import { Replay } from './replay.entity.ts';

type Of = Unit<UserActor>;
const DAY_MS = 86_400_000;

/** The links of a visit or of an athlete, newest first. */
export const listReplays = async (
  unit: Of,
  { visitId, athleteId }: { readonly visitId?: string; readonly athleteId?: string },
): Promise<Replay[]> => {
  if (visitId !== undefined) await visitInSight(unit, visitId, 'athlete.read');
  if (athleteId !== undefined) await athleteInSight(unit, athleteId, 'athlete.read');
  return unit.em.find(
    Replay,
    visitId === undefined ? { visit: { athlete: athleteId } } : { visit: visitId },
    { populate: ['by', 'passPhraseHash', 'rep.clip'], orderBy: { at: 'desc', id: 'desc' } },
  );
};

/** The pass phrase's hash, made before the transaction: it takes a third of a second. */
export const hashOf = (passPhrase: string | null): Promise<string | null> =>
  passPhrase === null ? Promise.resolve(null) : hashPassword(passPhrase);

/**
 * Makes a link. Its token is returned once and kept nowhere.
 * @throws Problem 'consent-withdrawn', 'consent-missing' without consent to sharing by link, 'call-first' without a call by eye
 */
export const makeReplay = async (
  unit: Of,
  body: z.output<typeof replayBody>,
  passPhraseHash: string | null,
): Promise<{ replay: Replay; token: string }> => {
  const { em, actor } = unit;
  const { visit, athlete } = await visitInSight(unit, body.visitId, 'replay.make');
  const { rep, clip } = await repInSight(unit, body.repId, 'replay.make');
  if (clip.visit.id !== visit.id || rep.supportSide !== body.side)
    throw new Problem('invalid-input', undefined, [
      { path: 'body.repId', message: 'Choose a rep of this visit, standing on this side.' },
    ]);
  await needConsent(em, athlete.id, 'sharing-by-link');
  if ((await em.count(Call, { visit: visit.id, side: body.side })) === 0)
    throw new Problem('call-first');
  const { fromFrame = rep.startFrame, toFrame = rep.endFrame } = body;
  needFrames(clip, fromFrame, toFrame);
  if (toFrame <= fromFrame)
    throw new Problem('invalid-input', undefined, [
      { path: 'body.toFrame', message: 'The span ends after it starts.' },
    ]);
  const span = { from: fromFrame, to: toFrame };
  if (body.hideHead) await needHiddenHead(em, clip, span);
  const earlier =
    body.beforeVisitId === null
      ? null
      : await chooseBefore(unit, body.beforeVisitId, { athlete, visit, rep, clip, span });
  if (earlier && body.hideHead) await needBeforeHidden(unit, earlier);
  const token = newToken();
  const replay = em.create(Replay, {
    visit,
    side: body.side,
    rep,
    fromFrame,
    toFrame,
    showReading: body.showReading,
    showCall: body.showCall,
    hideHead: body.hideHead,
    message: body.message,
    tokenHash: tokenHash(token),
    passPhraseHash,
    expiresAt: new Date(Date.now() + body.days * DAY_MS),
    by: await em.findOneOrFail(User, { id: actor.id }),
  });
  const before =
    earlier &&
    em.create(ReplayBefore, {
      replay,
      rep: earlier.rep,
      fromFrame: earlier.rep.startFrame,
      toFrame: earlier.rep.endFrame,
      hideHead: body.hideHead,
    });
  audit(unit, 'replay.make', replay.id, {
    athlete: athlete.id,
    visit: visit.id,
    side: body.side,
    ...(body.beforeVisitId !== null && { before: body.beforeVisitId }),
  });
  if (body.hideHead) {
    await askForCopy(unit, replay);
    if (before) await askForCopy(unit, before);
    const { id: replayId, expiresAt } = replay;
    await enqueue(unit, REMOVE_HIDDEN, { replayId }, { startAfter: expiresAt });
  }
  await em.flush();
  return { replay, token };
};

/**
 * How the head of a link stands, as its coach is told.
 * @param replay with `rep.clip` loaded
 */
export const headOfLink = ({ em }: Of, replay: Replay) =>
  headStateOf(em, replay, (replay.rep.unwrap() as Rep).clip.unwrap());

/** The earlier lift beside it, as its coach is told. */
export const earlierOfLink = async ({ em }: Of, replay: Replay): Promise<ReplayShape['before']> => {
  const before = await beforeOfLink(em, replay);
  if (!before) return null;
  const clip = (before.rep.unwrap() as Rep).clip.unwrap() as Clip;
  const { id, day } = clip.visit.unwrap() as Visit;
  return { visitId: id, visitDay: day, head: await headStateOf(em, before, clip) };
};

/** The link of this id, for a coach who may act on it. */
export const linkInSight = async (
  { em, actor }: Of,
  id: string,
  action: 'replay.make' | 'replay.revoke',
) => {
  const replay = found(
    await em.findOne(
      Replay,
      { id },
      { populate: ['visit.athlete', 'by', 'passPhraseHash', 'rep.clip'] },
    ),
  );
  needCaseload(actor, action, replay.visit.unwrap().athlete.unwrap());
  return replay;
};

/** Kills a link at once; doing it twice is fine. */
export const revokeReplay = async (unit: Of, id: string): Promise<Replay> => {
  const replay = await linkInSight(unit, id, 'replay.revoke');
  if (!replay.revokedAt) {
    replay.revokedAt = new Date();
    audit(unit, 'replay.revoke', id, { athlete: replay.visit.unwrap().athlete.id });
    await enqueue(unit, REMOVE_HIDDEN, { replayId: id });
  }
  await unit.em.flush();
  return replay;
};

/** Makes the copies with a hidden head again where that was given up; doing it twice is fine. */
export const hideHeadAgain = async (unit: Of, id: string): Promise<Replay> => {
  const replay = await linkInSight(unit, id, 'replay.make');
  if (!hasEnded(replay)) {
    if ((await headOfLink(unit, replay)) === 'failed') await askForCopy(unit, replay);
    const before = await beforeOfLink(unit.em, replay);
    if (before?.hideFailed) await askForCopy(unit, before);
  }
  await unit.em.flush();
  return replay;
};
