import type { UserActor } from '#shared/access/actors.ts';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import { landmarksIn } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { auditOnce } from '../audit/audit.ts';
import { needFrames } from '../clips/clip-in-sight.ts';
import { readingIsStale } from '../readings/stale.ts';
import { type RepInSight, repInSight } from '../reps/rep-in-sight.ts';
import { applyCommands, changedRows, type Outcome, placeOf } from './apply-commands.ts';
import { lockMarks, type MarkRow, readMarks, uuidArray, writeMarks } from './mark-store.ts';

/** @throws Problem 'landmark-not-in-view' or 'frame-out-of-range' */
const needPlaces = ({ rep, clip }: RepInSight, commands: readonly MarkCommand[]): void => {
  needFrames(clip, ...commands.map(({ frame }) => frame));
  const view = viewOf(clip.cameraStood, rep.supportSide);
  const markable = new Set<string>(landmarksIn(view));
  const stray = commands.find(({ landmark }) => !markable.has(landmark as LandmarkId));
  if (stray)
    throw new Problem(
      'landmark-not-in-view',
      `‘${stray.landmark}’ is not marked in a clip seen from the ${view}.`,
    );
};

const doneBefore = async (
  { em }: Unit<UserActor>,
  repId: string,
  commands: readonly MarkCommand[],
): Promise<ReadonlySet<string>> => {
  const rows = await em.execute<{ id: string }[]>(
    'select id from mark_command where rep_id = ? and id = any (?::uuid[])',
    [repId, uuidArray(commands.map(({ id }) => id))],
  );
  return new Set(rows.map(({ id }) => id));
};

const rememberCommands = async (
  { em, actor }: Unit<UserActor>,
  repId: string,
  outcomes: readonly Outcome[],
): Promise<void> => {
  const applied = outcomes.flatMap(({ command, outcome, row }) =>
    outcome === 'applied' && row
      ? [{ id: command.id, frame: row.frame, landmark: row.landmark, revision: row.revision }]
      : [],
  );
  if (applied.length === 0) return;
  await em.execute(
    `insert into mark_command (rep_id, practice_id, id, frame, landmark, revision, at)
      select ?::uuid, ?::uuid, r.id, r.frame, r.landmark, r.revision, now()
      from jsonb_to_recordset(?::jsonb) as r (id uuid, frame int, landmark text, revision int)`,
    [repId, actor.practiceId, JSON.stringify(applied)],
  );
};

/**
 * Does a batch of marking commands. All that can be done is done; conflicts are answered with what is stored.
 * Batches of one rep run one after the other.
 */
export const saveMarks = async (
  unit: Unit<UserActor>,
  repId: string,
  commands: readonly MarkCommand[],
): Promise<{ sight: RepInSight; outcomes: readonly Outcome[] }> => {
  const { em, actor } = unit;
  const sight = await repInSight(unit, repId, 'marks.save');
  needPlaces(sight, commands);
  await em.execute('select 1 from rep where id = ? for update', [repId]);
  const places = new Map(commands.map((command) => [placeOf(command), command]));
  const stored = await lockMarks(em, repId, [...places.values()]);
  const me = await em.findOneOrFail(User, { id: actor.id });
  const outcomes = applyCommands(
    commands,
    new Map(stored.map((row) => [placeOf(row), row])),
    await doneBefore(unit, repId, commands),
    { repId, byUser: actor.id, byName: me.name, at: new Date() },
  );
  const rows = changedRows(outcomes);
  await writeMarks(em, actor.practiceId, rows);
  await rememberCommands(unit, repId, outcomes);
  if (rows.length > 0) {
    await auditOnce(unit, 'rep.mark', repId, {
      athlete: sight.athlete.id,
      clip: sight.clip.id,
    });
    await readingIsStale(unit, sight.clip.visit.id, sight.rep.supportSide);
    await tell(
      unit,
      { coachId: sight.athlete.coach.id },
      {
        type: 'marks',
        clipId: sight.clip.id,
        repId,
        byUserId: actor.id,
      },
    );
  }
  return { sight, outcomes };
};

/** Every mark of a rep, by frame. */
export const marksOfRep = async (unit: Unit<UserActor>, repId: string): Promise<MarkRow[]> => {
  await repInSight(unit, repId, 'athlete.read');
  return readMarks(unit.em, [repId]);
};
