import type { UserActor } from '#shared/access/actors.ts';
import { side as sides, type Side } from '#shared/contracts/primitives.ts';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { changeRows } from '#shared/reading/changes.ts';
import { partHalfWidth } from '#shared/reading/part-half-width.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Call } from '../calls/call.entity.ts';
import { Clip } from '../clips/clip.entity.ts';
import { lastGiven } from '../plans/give-plan.ts';
import { Plan } from '../plans/plan.entity.ts';
import { Practice } from '../practice/practice.entity.ts';
import { sideReading } from '../readings/readings.service.ts';
import { sideReview } from '../reviews/reviews.service.ts';
import type { VisitInSight } from '../visits/visit-in-sight.ts';
import { keyFramesOf } from './key-frames.ts';
import type { ReportContent, ReportPlan, ReportReading, ReportSide } from './report-content.ts';

type Of = Unit<UserActor>;

/** What a report says of a reading. */
export const readingOf = (reading: Reading): ReportReading => {
  const { result, plusMinus } = reading;
  const { figures } = result;
  const used = result.reps.filter((rep) => rep.used);
  return {
    label: reading.label,
    code: reading.code,
    provisional: reading.provisional,
    gates: gatesOf(result.rules),
    set: result.set,
    assumption: result.thighTurnsLittle,
    figures: figures && {
      change: { value: figures.d, plusMinus: plusMinus ?? 1.96 * figures.uC },
      pelvis: { value: figures.pelvis.value, plusMinus: partHalfWidth(figures, figures.pelvis) },
      thigh: { value: figures.thigh.value, plusMinus: partHalfWidth(figures, figures.thigh) },
      pEarly: figures.pEarly,
      smallestFound: figures.mdt90,
    },
    reps: { used: used.length, of: reading.reps.length },
    marks: reading.marking.marks,
    markError: reading.markError,
    engine: reading.engine,
    protocol: reading.protocol.version,
    course: result.course,
    repCourses: used.length > 1 ? used.map(({ curve }) => curve) : [],
    changes: changeRows(result).map(({ label, sign, unit, change, smallest, beyond }) => ({
      ...{ label, sign, unit, change, smallest, beyond },
    })),
  };
};

const sideOf = async (unit: Of, page: SidePage, athlete: Athlete): Promise<ReportSide> => {
  const review = await sideReview(unit, page.visit.id, page.side);
  const [last] = review.steps;
  return {
    side: page.side,
    calls: page.calls.map(({ seen, confidence, substitutions, at, gates, beforeFigures }) => ({
      ...{ seen, confidence, substitutions, at, gates, beforeFigures },
    })),
    calledBy: page.calls.map(({ by }) => by.name),
    reading: page.reading && readingOf(page.reading),
    keyFrames: page.reading && (await keyFramesOf(unit.em, page.reading, page.side, athlete)),
    review: {
      state: review.state,
      by: last?.by.name ?? null,
      at: last?.at ?? null,
      about: last?.about.kind ?? null,
    },
  };
};

/** What the athlete has now: a plan that was never given, or is stopped, is not told. */
const plansOf = async (unit: Of, visitId: string): Promise<ReportPlan[]> => {
  const plans = await unit.em.find(Plan, { visit: visitId }, { orderBy: { side: 'asc' } });
  const told: ReportPlan[] = [];
  for (const plan of plans) {
    const given = await lastGiven(unit, plan.id);
    if (!given?.content) continue;
    await unit.em.populate(given, ['by']);
    const { items, note, retestOn } = given.content;
    told.push({
      side: plan.side,
      givenAt: given.at.toISOString(),
      givenBy: given.by.getEntity().name,
      retestOn,
      note,
      items: items.map(({ name, side, purpose, dose, cue }) => ({
        ...{ name, side, purpose, dose, cue },
      })),
    });
  }
  return told;
};

/** Sides on which somebody has said what they saw: figures of others are shown to nobody. */
const calledSides = async ({ em }: Of, visitId: string): Promise<Side[]> => {
  const calls = await em.find(Call, { visit: visitId }, { fields: ['side'] });
  return sides.options.filter((side) => calls.some((call) => call.side === side));
};

/**
 * All that a report of this visit says now.
 * @throws Problem 'call-first' where no side has a call by eye
 */
export const gatherReport = async (
  unit: Of,
  { visit, athlete, coach }: VisitInSight,
): Promise<ReportContent> => {
  const { em, actor } = unit;
  const called = await calledSides(unit, visit.id);
  if (called.length === 0) throw new Problem('call-first');
  const pages: SidePage[] = [];
  for (const side of called) pages.push(await sideReading(unit, visit.id, side));
  const told: ReportSide[] = [];
  for (const page of pages) told.push(await sideOf(unit, page, athlete));
  const clips = await em.find(Clip, { visit: visit.id, state: 'ready' });
  const { name, contact } = await em.findOneOrFail(Practice, { id: actor.practiceId });
  return {
    practice: { name, contact },
    athlete: {
      name: `${athlete.givenName} ${athlete.familyName}`,
      birthDate: athlete.birthDate,
    },
    visit: {
      day: visit.day,
      coach: coach.name,
      filming: visit.filming,
      views: [...new Set(clips.map(({ view }) => view))],
      clips: clips.length,
    },
    sides: told,
    compared: pages[0]?.compared ?? null,
    plans: await plansOf(unit, visit.id),
  };
};
