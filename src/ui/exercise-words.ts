import type { Dose } from '#shared/contracts/athlete-plan.ts';
import type { SafetyQuestion } from '#shared/contracts/visits.ts';

const times = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`;

/** `3 sets of 8, 60 s rest, 4 days a week` */
export const doseWords = (dose: Dose): string => {
  const { sets, repetitions, holdSeconds, restSeconds, daysPerWeek } = dose;
  const of = repetitions === null ? `${holdSeconds ?? 0} s held` : String(repetitions);
  const rest = restSeconds === 0 ? [] : [`${restSeconds} s rest`];
  return [`${times(sets, 'set')} of ${of}`, ...rest, `${times(daysPerWeek, 'day')} a week`].join(
    ', ',
  );
};

/** What an answer of the safety check is about, after ‘Held back for’. */
export const SAFETY_SHORT: Record<SafetyQuestion, string> = {
  'pain-today': 'pain on the day',
  'hip-replacement-or-limits': 'a hip replacement or a surgeon’s limits',
  'weight-bearing-limits': 'limits to bearing weight',
  'recent-surgery-or-fracture': 'recent surgery or a fracture',
  'falls-or-poor-balance': 'falls or poor balance',
  'vertigo-or-dizziness': 'vertigo or dizziness',
  'nerve-symptoms': 'numbness, tingling or weakness in a leg',
  'confidential-any': 'the confidential question',
};
