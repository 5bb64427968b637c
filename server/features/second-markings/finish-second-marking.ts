import type { UserActor } from '#shared/access/actors.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { RepInput } from '#shared/course/types.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import type { ReadingCode } from '#shared/reading/types.ts';
import { shownSet } from '#shared/records/shared-quiet.ts';
import { viewOf } from '#shared/records/views.ts';
import {
  countHiddenOnce,
  inputOfMarking,
  measuredTwice,
  type SecondResult,
} from '#shared/reliability/compare-markings.ts';
import { markedTwice } from '#shared/reliability/marked-twice.ts';
import { NO_BOUNDARIES } from '#shared/contracts/reps.ts';
import { type ReadingRules, rulesOf } from '#shared/protocol/protocol.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { MarkRow } from '../marks/mark-store.ts';
import { audit } from '../audit/audit.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { deriveApart } from '../readings/derive-apart.ts';
import { measuredClip, timesOfClip } from '../reps/reps.presenter.ts';
import { readSecondMarks } from './second-mark-store.ts';
import { ownSecondMarking, type SecondInSight } from './second-marking-in-sight.ts';
import { framesDone } from './second-markings.presenter.ts';

const readingOf = async (
  rep: RepInput | null,
  set: LandmarkSetId,
  rules: ReadingRules,
): Promise<ReadingCode | null> => {
  if (!rep) return null;
  const { code } = await deriveApart({
    engine: CURRENT_ENGINE,
    supportSide: rep.supportSide,
    set,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules,
    reps: [rep],
  });
  return code === 'not-measurable' ? null : code;
};

/** Both markings side by side: the places of the marks, lift and turn, and what the same frames read. */
const resultOf = async (
  { marking, rep, clip, athlete }: SecondInSight,
  second: readonly MarkRow[],
  rules: ReadingRules,
): Promise<SecondResult> => {
  const first = marking.first.unwrap();
  const phases = marking.phases.unwrap();
  if (!first || !phases)
    throw new Error('A second marking is finished with its first marks loaded.');
  const measured = measuredClip(clip);
  const facts = {
    rep: {
      id: rep.id,
      supportSide: rep.supportSide,
      view: viewOf(clip.cameraStood, rep.supportSide),
      boundaries: NO_BOUNDARIES,
      excluded: null,
    },
    clip: measured,
    times: timesOfClip(clip),
    bodyHeightMm: athlete.heightMm ?? null,
  };
  const before = inputOfMarking(facts, first, phases);
  const after = inputOfMarking(facts, second, phases);
  const set = before ? shownSet(before) : 'bare';
  const readings = [
    await readingOf(before, set, rules),
    await readingOf(after, set, rules),
  ] as const;
  return {
    marks: markedTwice(first, second, Math.max(clip.width ?? 0, clip.height ?? 0)),
    hiddenOnce: countHiddenOnce(first, second),
    values: measuredTwice(before, after, set, ASSUMED_MARK_ERROR),
    readings: readings[0] && readings[1] ? [readings[0], readings[1]] : null,
    mmPerPx: measured.mmPerPx,
  };
};

/**
 * Finishes a second marking: from now on the agreement is shown and nothing of it changes. Finishing twice does
 * nothing the second time.
 * @throws Problem 'second-marks-missing'
 */
export const finishSecondMarking = async (
  unit: Unit<UserActor>,
  id: string,
): Promise<SecondInSight> => {
  const sight = await ownSecondMarking(unit, id);
  const { marking } = sight;
  if (marking.finishedAt) return sight;
  const marks = await readSecondMarks(unit.em, [id]);
  const missing = marking.frames.length - framesDone(marking, marks);
  if (missing > 0)
    throw new Problem(
      'second-marks-missing',
      missing === 1
        ? 'One frame still lacks landmarks: place them or mark them hidden.'
        : `${missing} frames still lack landmarks: place them or mark them hidden.`,
    );
  await unit.em.populate(marking, ['first', 'phases']);
  marking.result = await resultOf(sight, marks, rulesOf((await currentProtocol(unit.em)).values));
  marking.finishedAt = new Date();
  audit(unit, 'second-marking.finish', id, {
    athlete: sight.athlete.id,
    frames: marking.frames.length,
  });
  await unit.em.flush();
  return sight;
};
