import { matchLifts } from '#shared/course/match-lifts.ts';
import type { UserActor } from '#shared/access/actors.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../../http/problem.ts';
import type { Athlete } from '../../athletes/athlete.entity.ts';
import { Call } from '../../calls/call.entity.ts';
import { Clip } from '../../clips/clip.entity.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import { type NumberedRep, storedReps } from '../../reps/stored-reps.ts';
import { visitInSight } from '../../visits/visit-in-sight.ts';
import type { Visit } from '../../visits/visit.entity.ts';
import { needHiddenHead } from '../hidden-copies.ts';
import { spanOf } from '../span.ts';

interface Now {
  readonly athlete: Athlete;
  readonly visit: Visit;
  readonly rep: Rep;
  readonly clip: Clip;
  readonly span: { readonly from: number; readonly to: number };
}

const refused = (message: string) =>
  new Problem('invalid-input', undefined, [{ path: 'body.beforeVisitId', message }]);

const wayOf = (stored: NumberedRep, span: Now['span']) =>
  spanOf(stored, span, { figures: false, gates: STANDARD_GATES }).way;

const whole = ({ startFrame, endFrame }: Rep) => ({ from: startFrame, to: endFrame });

/** Clips of a visit that can be played. */
const playable = async ({ em }: Unit<UserActor>, visitId: string): Promise<Clip[]> =>
  await em.find(
    Clip,
    { visit: visitId, state: 'ready' },
    { populate: ['frames'], orderBy: { uploadedAt: 'asc', id: 'asc' } },
  );

/**
 * The rep of an earlier visit that a link shows beside its own: of the same side and filmed from the same side, the
 * one that goes furthest with it.
 * @throws Problem 'invalid-input' where there is none, 'call-first' as for the link's own rep
 */
export const chooseBefore = async (
  unit: Unit<UserActor>,
  visitId: string,
  { athlete, visit, rep, clip, span }: Now,
): Promise<{ readonly rep: Rep; readonly clip: Clip }> => {
  const { em } = unit;
  const earlier = await visitInSight(unit, visitId, 'replay.make');
  if (earlier.athlete.id !== athlete.id || earlier.visit.day >= visit.day)
    throw refused('Choose an earlier visit of this athlete.');
  const side = rep.supportSide;
  if ((await em.count(Call, { visit: visitId, side })) === 0) throw new Problem('call-first');
  const clips = await playable(unit, visitId);
  const own = (await storedReps(em, [clip], athlete)).find((each) => each.rep.id === rep.id);
  const way = own && wayOf(own, span);
  const view = viewOf(clip.cameraStood, side);
  const found = (await storedReps(em, clips, athlete))
    .filter((each) => each.rep.supportSide === side && each.rep.excluded === null)
    .filter((each) => viewOf(each.clip.cameraStood, side) === view)
    .map((each) => ({
      each,
      moments: way ? matchLifts(wayOf(each, whole(each.rep)), way) : [],
    }))
    .filter(({ moments }) => moments.length > 0)
    .map(({ each, moments }) => {
      const lifts = moments.map(({ first }) => Number(first.lift));
      return { each, reach: Math.max(...lifts) - Math.min(...lifts) };
    });
  const best = found.toSorted((a, b) => b.reach - a.reach)[0]?.each;
  if (!best)
    throw refused(
      `No lift of that visit standing on the ${side} can be matched with this one. Both need marks over the rise, filmed from the same side.`,
    );
  return { rep: best.rep, clip: best.clip };
};

/** Makes sure that the earlier film may leave as the link promises. */
export const needBeforeHidden = async (
  { em }: Unit<UserActor>,
  { rep, clip }: { readonly rep: Rep; readonly clip: Clip },
): Promise<void> => {
  try {
    await needHiddenHead(em, clip, whole(rep));
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    throw new Problem(error.code, `The earlier film: ${error.message}`);
  }
};
