import type { UserActor } from '#shared/access/actors.ts';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import type {
  SecondMarkCommand,
  SecondMarkingDocument,
  SecondMarkingSummary,
} from '#shared/contracts/second-markings.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { User } from '../accounts/user.entity.ts';
import { applyCommands, changedRows, type Outcome, placeOf } from '../marks/apply-commands.ts';
import { readMarks } from '../marks/mark-store.ts';
import { audit } from '../audit/audit.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { presentRules } from '../protocol/protocol.presenter.ts';
import { Rep } from '../reps/rep.entity.ts';
import { repInSight } from '../reps/rep-in-sight.ts';
import { REP_ORDER } from '../reps/stored-reps.ts';
import { handFrames } from './first-marks.ts';
import { possibleMarkers } from './marker.ts';
import {
  readSecondMarks,
  rememberSecondCommands,
  secondCommandsDone,
  writeSecondMarks,
} from './second-mark-store.ts';
import { ownSecondMarking, secondInSight, type SecondInSight } from './second-marking-in-sight.ts';
import { SecondMarking } from './second-marking.entity.ts';
import {
  presentAgreement,
  presentSecondMarking,
  presentSecondSummary,
} from './second-markings.presenter.ts';

type Of = Unit<UserActor>;

/** The second markings of a rep, newest first, and whom one could ask. */
export const secondMarkingsOf = async (unit: Of, repId: string) => {
  const { em, actor } = unit;
  const { athlete } = await repInSight(unit, repId, 'athlete.read');
  const markings = (await em.find(
    SecondMarking,
    { rep: repId },
    { populate: ['marker', 'askedBy'], orderBy: { askedAt: 'desc', id: 'desc' } },
  )) as SecondMarking[];
  const marks = await readSecondMarks(
    em,
    markings.map(({ id }) => id),
  );
  return {
    items: markings.map((marking) =>
      presentSecondSummary(
        marking,
        marks.filter((mark) => mark.repId === marking.id),
        actor.id,
      ),
    ),
    people: (await possibleMarkers(em, athlete)).map(presentPerson),
    markedFrames: handFrames(await readMarks(em, [repId])),
  };
};

const agreementOf = async ({ em }: Of, { marking, rep }: SecondInSight) => {
  if (!marking.result) return null;
  const ids = [...new Set(marking.result.marks.map(({ firstBy }) => firstBy))];
  return presentAgreement(rep.id, marking.result, await em.find(User, { id: { $in: ids } }));
};

/** What leaves of a second marking in sight. */
export const documentOf = async (
  unit: Of,
  sight: SecondInSight,
): Promise<SecondMarkingDocument> => {
  const { em, actor } = unit;
  const { marking, rep, clip } = sight;
  const reps = await em.find(Rep, { clip: clip.id }, { orderBy: REP_ORDER });
  return presentSecondMarking(sight, {
    marks: await readSecondMarks(em, [marking.id]),
    repNumber: reps.findIndex(({ id }) => id === rep.id) + 1,
    repCount: reps.length,
    agreement: await agreementOf(unit, sight),
    protocol: presentRules(await currentProtocol(em)),
    actorId: actor.id,
  });
};

/**
 * A second marking. While it is open it is for its marker alone.
 * @throws Problem 'not-allowed'
 */
export const secondMarking = async (unit: Of, id: string): Promise<SecondMarkingDocument> => {
  const sight = await secondInSight(unit, id, 'athlete.read');
  const { marking } = sight;
  if (!marking.finishedAt) {
    if (marking.marker.id !== unit.actor.id)
      throw new Problem('not-allowed', 'Its marks are seen by others once it is finished.');
    marking.openedAt ??= new Date();
    await unit.em.flush();
  }
  return documentOf(unit, sight);
};

/** As the commands of a first marking, always by a hand that looked. */
const asMarkCommand = ({ set, ...rest }: SecondMarkCommand): MarkCommand => ({
  ...rest,
  set:
    set.to === 'point'
      ? { ...set, source: 'hand', looked: true, confidence: null }
      : { to: set.to },
});

/** @throws Problem 'not-asked-here' */
const needAsked = ({ frames }: SecondMarking, commands: readonly SecondMarkCommand[]): void => {
  const asked = new Set(
    frames.flatMap(({ frame, landmarks }) =>
      landmarks.map((landmark) => placeOf({ frame, landmark })),
    ),
  );
  const stray = commands.find((command) => !asked.has(placeOf(command)));
  if (stray)
    throw new Problem(
      'not-asked-here',
      `‘${stray.landmark}’ is not asked for on frame ${stray.frame}.`,
    );
};

/** Does a batch of commands on second marks; conflicts are answered with what is stored. */
export const saveSecondMarks = async (
  unit: Of,
  id: string,
  commands: readonly SecondMarkCommand[],
): Promise<{ summary: SecondMarkingSummary; outcomes: readonly Outcome[] }> => {
  const { em, actor } = unit;
  const { marking } = await ownSecondMarking(unit, id);
  if (marking.finishedAt) throw new Problem('second-marking-finished');
  needAsked(marking, commands);
  const stored = await readSecondMarks(em, [id], { removed: true });
  const outcomes = applyCommands(
    commands.map(asMarkCommand),
    new Map(stored.map((row) => [placeOf(row), row])),
    await secondCommandsDone(
      em,
      id,
      commands.map((command) => command.id),
    ),
    { repId: id, byUser: actor.id, byName: marking.marker.unwrap().name, at: new Date() },
  );
  await writeSecondMarks(em, changedRows(outcomes));
  await rememberSecondCommands(
    em,
    id,
    outcomes.flatMap(({ command, outcome }) => (outcome === 'applied' ? [command.id] : [])),
  );
  return {
    outcomes,
    summary: presentSecondSummary(marking, await readSecondMarks(em, [id]), actor.id),
  };
};

/**
 * Gives up a second marking that is not finished: its marker may, and whoever asked for it.
 * @throws Problem 'not-allowed' or 'second-marking-finished'
 */
export const discardSecondMarking = async (unit: Of, id: string): Promise<void> => {
  const { marking, athlete } = await secondInSight(unit, id, 'marks.second');
  if (marking.marker.id !== unit.actor.id && marking.askedBy.id !== unit.actor.id)
    throw new Problem('not-allowed', 'Only who asked or who was asked can give it up.');
  if (marking.finishedAt) throw new Problem('second-marking-finished');
  audit(unit, 'second-marking.discard', id, {
    athlete: athlete.id,
    frames: marking.frames.length,
  });
  unit.em.remove(marking);
  await unit.em.flush();
};
