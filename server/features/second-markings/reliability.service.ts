import { group } from 'd3-array';
import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import { seen, type Seen } from '#shared/contracts/calls.ts';
import type { MarkingPair, Reliability } from '#shared/contracts/reliability.ts';
import { READING_CODES } from '#shared/reading/types.ts';
import { LEAST_DOUBLY_MARKED } from '#shared/reliability/mark-repeat.ts';
import {
  answerAgreementOf,
  type FinishedMarks,
  markRepeatOf,
  valueAgreementOf,
} from '#shared/reliability/summary.ts';
import type { SecondResult } from '#shared/reliability/compare-markings.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { type Finished, finishedMarkings, marksBetween, ownErrorOf } from './finished-markings.ts';
import { readSecondMarks } from './second-mark-store.ts';
import { SecondMarking } from './second-marking.entity.ts';
import { presentMarkRepeat, presentSecondSummary } from './second-markings.presenter.ts';

type Of = Unit<UserActor>;
type Person = ReturnType<typeof presentPerson>;

const pairedBy = (first: string, second: string): string => `${first} ${second}`;

/** Values and readings belong to two people only where every first mark was one person's. */
const soleFirst = ({ marks }: SecondResult): string | null => {
  const hands = new Set(marks.map(({ firstBy }) => firstBy));
  return hands.size === 1 ? ([...hands][0] ?? null) : null;
};

const figuresOf = (
  marks: readonly FinishedMarks[],
  results: readonly SecondResult[],
): Omit<MarkingPair, 'first' | 'second'> => {
  const values = results.flatMap((result) => result.values);
  const turn = valueAgreementOf(values.flatMap((value) => (value.turn ? [value.turn] : [])));
  const lift = valueAgreementOf(values.flatMap((value) => (value.lift ? [value.lift] : [])));
  return {
    repeat: presentMarkRepeat(markRepeatOf(marks)),
    turn: { ...turn, points: [...turn.points] },
    lift: { ...lift, points: [...lift.points] },
    readings: answerAgreementOf(
      READING_CODES,
      results.flatMap(({ readings }) => (readings ? [readings] : [])),
    ),
  };
};

const resultsOf = (finished: readonly Finished[], first: string, second: string) =>
  finished
    .filter(({ markerId, result }) => markerId === second && soleFirst(result) === first)
    .map(({ result }) => result);

/** Pairs of who marked first and who marked again, of which the actor may see one. */
const pairsOf = (
  finished: readonly Finished[],
  people: ReadonlyMap<string, Person>,
  sees: (id: string) => boolean,
): MarkingPair[] => {
  const pairs = new Map<string, readonly [string, string]>();
  for (const { markerId, result } of finished)
    for (const { firstBy } of result.marks)
      if (sees(firstBy) || sees(markerId))
        pairs.set(pairedBy(firstBy, markerId), [firstBy, markerId]);
  return [...pairs.values()].flatMap(([firstId, secondId]): MarkingPair[] => {
    const first = people.get(firstId);
    const second = people.get(secondId);
    if (!first || !second) return [];
    const marks = marksBetween(finished, firstId, secondId);
    return [{ first, second, ...figuresOf(marks, resultsOf(finished, firstId, secondId)) }];
  });
};

interface CallRow {
  readonly place: string;
  readonly seen: Seen;
  readonly by: string;
}

/** The first call of each person on each side, as far as no figure of that side had been shown before. */
const blindCalls = ({ em }: Of): Promise<CallRow[]> =>
  em.execute<CallRow[]>(
    `select visit_id || ' ' || side as place, seen, by_id as by from (
        select distinct on (visit_id, side, by_id) visit_id, side, by_id, seen, before_figures
        from call order by visit_id, side, by_id, at) c
      where before_figures order by place, by`,
  );

const callPairs = (
  rows: readonly CallRow[],
  people: ReadonlyMap<string, Person>,
  sees: (id: string) => boolean,
): Reliability['calls'] => {
  const pairs = new Map<string, { ids: readonly [string, string]; seen: [Seen, Seen][] }>();
  for (const calls of group(rows, ({ place }) => place).values())
    calls.forEach((one, index) => {
      for (const other of calls.slice(index + 1)) {
        if (!sees(one.by) && !sees(other.by)) continue;
        const key = pairedBy(one.by, other.by);
        const there = pairs.get(key) ?? { ids: [one.by, other.by] as const, seen: [] };
        there.seen.push([one.seen, other.seen]);
        pairs.set(key, there);
      }
    });
  return [...pairs.values()].flatMap(({ ids, seen: answers }) => {
    const one = people.get(ids[0]);
    const other = people.get(ids[1]);
    return one && other
      ? [{ one, other, agreement: answerAgreementOf(seen.options, answers) }]
      : [];
  });
};

/** Second markings that the actor was asked for and has not finished, oldest first. */
const waitingFor = async ({ em, actor }: Of): Promise<Reliability['waiting']> => {
  const markings = (await em.find(
    SecondMarking,
    { marker: actor.id, finishedAt: null },
    {
      populate: ['marker', 'askedBy', 'rep.clip.visit.athlete'],
      orderBy: { askedAt: 'asc', id: 'asc' },
    },
  )) as SecondMarking[];
  const marks = await readSecondMarks(
    em,
    markings.map(({ id }) => id),
  );
  return markings.flatMap((marking) => {
    const rep = marking.rep.unwrap() as Rep;
    const athlete = (rep.clip.unwrap() as Clip).visit.unwrap().athlete.unwrap() as Athlete;
    const { practiceId } = athlete;
    const coachId = athlete.coach.id;
    if (!can(actor, 'marks.second', { kind: 'caseload', practiceId, coachId })) return [];
    const own = marks.filter((mark) => mark.repId === marking.id);
    return [
      {
        summary: presentSecondSummary(marking, own, actor.id),
        athlete: { id: athlete.id, name: `${athlete.givenName} ${athlete.familyName}` },
      },
    ];
  });
};

/** How well everything repeats: of a coach's own hand, of the coaches assigned to a supervisor, of all to an owner. */
export const reliabilityOf = async (unit: Of): Promise<Reliability> => {
  const { em, actor } = unit;
  const { practiceId } = actor;
  const sees = (coachId: string) =>
    can(actor, 'reliability.read', { kind: 'caseload', practiceId, coachId });
  const users = await em.find(User, {}, { orderBy: { name: 'asc', id: 'asc' } });
  const people = new Map(users.map((user) => [user.id, presentPerson(user)]));
  const finished = await finishedMarkings(em, null);
  const pairs = pairsOf(finished, people, sees);
  const repeats = pairs.filter(({ first, second }) => first.id === second.id);
  const all = repeats.map(({ first }) => first.id);
  return {
    people: users
      .filter((user) => !user.disabledAt && sees(user.id))
      .map((user) => {
        const error = ownErrorOf(finished, user.id);
        return {
          person: presentPerson(user),
          px: error.anatomicalPx,
          fromFrames: error.doublyMarkedFrames,
          frames: markRepeatOf(marksBetween(finished, user.id, user.id)).frames,
        };
      }),
    least: LEAST_DOUBLY_MARKED,
    repeats,
    between: pairs.filter(({ first, second }) => first.id !== second.id),
    waiting: await waitingFor(unit),
    practice:
      repeats.length === 0
        ? null
        : figuresOf(
            all.flatMap((id) => marksBetween(finished, id, id)),
            all.flatMap((id) => resultsOf(finished, id, id)),
          ),
    calls: callPairs(await blindCalls(unit), people, sees),
  };
};
