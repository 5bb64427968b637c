import { randomInt } from 'node:crypto';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { SecondMarkingSummary, secondMarkingBody } from '#shared/contracts/second-markings.ts';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import { chooseFrames, shuffled } from '#shared/reliability/asked-frames.ts';
import type { FirstMark } from '#shared/reliability/marked-twice.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { peopleFor } from '../people/people-for.ts';
import { repInSight } from '../reps/rep-in-sight.ts';
import { storedReps } from '../reps/stored-reps.ts';
import { writeOf } from '../waiting-mail/mail-choices.ts';
import { firstMarksOn, handFrames, markableFrames, phasesOf } from './first-marks.ts';
import { possibleMarkers } from './marker.ts';
import { SecondMarking } from './second-marking.entity.ts';
import { presentSecondSummary } from './second-markings.presenter.ts';

/** What is asked on a frame, in the order in which landmarks are led everywhere. */
const askedOn = (frame: number, first: readonly FirstMark[]) => {
  const here = new Set(first.flatMap((mark) => (mark.frame === frame ? [mark.landmark] : [])));
  return { frame, landmarks: LANDMARK_IDS.filter((id) => here.has(id)) };
};

/**
 * Asks somebody to mark frames of a rep again. The first marks are kept as they stand now: what is moved later does
 * not change what is compared.
 */
export const startSecondMarking = async (
  unit: Unit<UserActor>,
  repId: string,
  { markerId, frames }: z.output<typeof secondMarkingBody>,
): Promise<SecondMarkingSummary> => {
  const { em, actor } = unit;
  const { rep, clip, athlete } = await repInSight(unit, repId, 'marks.second');
  // two who ask at once ask one after the other
  await em.execute('select 1 from rep where id = ? for update', [repId]);
  const marker = (await possibleMarkers(em, athlete)).find(
    ({ id }) => id === (markerId ?? actor.id),
  );
  if (!marker) throw new Problem('marker-cannot-see');
  const open = await em.count(SecondMarking, { rep: repId, marker: marker.id, finishedAt: null });
  if (open > 0) throw new Problem('second-marking-open');
  const stored = found((await storedReps(em, [clip], athlete)).find((each) => each.rep === rep));
  const { marks } = stored;
  const marked = new Set(handFrames(marks));
  const markable = markableFrames(stored);
  const gates = gatesOf((await currentProtocol(em)).values);
  const chosen = frames
    ? frames.filter((frame) => marked.has(frame))
    : chooseFrames(markable, gates);
  const places = new Set(chosen);
  const first = firstMarksOn(marks, places);
  if (first.length === 0) throw new Problem('nothing-to-mark-again');
  const marking = em.create(SecondMarking, {
    rep,
    marker,
    askedBy: em.getReference(User, actor.id),
    frames: shuffled(
      [...places].map((frame) => askedOn(frame, first)),
      (limit) => randomInt(limit),
    ),
    first,
    phases: phasesOf(markable.filter(({ frame }) => places.has(frame))),
  });
  audit(unit, 'second-marking.start', marking.id, {
    athlete: athlete.id,
    rep: repId,
    marker: marker.id,
    frames: places.size,
  });
  await em.flush();
  const may = await peopleFor(em, athlete, 'marks.second');
  await writeOf(
    unit,
    may.flatMap(({ id }) => (id === marker.id ? [id] : [])),
    {
      kind: 'second-marking',
      aboutId: marking.id,
      path: `/second-markings/${marking.id}`,
    },
  );
  await em.populate(marking, ['askedBy', 'marker']);
  return presentSecondSummary(marking, [], actor.id);
};
