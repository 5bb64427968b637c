import { readFileSync } from 'node:fs';
import { trialOf } from '#shared/evaluate/trial.ts';
import type { Call } from '#shared/contracts/calls.ts';
import { type Reading, readingLabel, type SidePage } from '#shared/contracts/readings.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { STANDARD_GATES, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { athleteId, clipId, coachId, repId, visitId } from './records.ts';

/** A side's page as the server answers it, from a trial of known truth and the engine itself. */
const coach = { id: coachId, name: 'Maren Okafor' };
const at = '2026-03-03T16:20:00Z';
const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;

const derived = new Map<string, ReadingResult>();

/** The engine's answer for a trial; worked out once. */
export const resultOf = (name: string): ReadingResult => {
  const known = derived.get(name);
  if (known) return known;
  // in a browser's world a file has no address: by the folder the tests are run from
  const trial = trialOf(JSON.parse(readFileSync(`tests/fixtures/golden/${name}.json`, 'utf8')));
  const result = deriveReading({
    engine: 1,
    supportSide: trial.supportSide,
    set: null,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: trial.reps.map((rep, n) => ({
      ...rep,
      id: repId(n + 1),
      labels: null,
      frames: rep.frames.map((frame) => ({
        ...frame,
        time: milliseconds((frame.frame * 1000) / 60),
      })),
    })),
  });
  derived.set(name, result);
  return result;
};

export const aCall = (change: Partial<Call> = {}): Call => ({
  id: uuid(800),
  visitId,
  side: 'right',
  seen: 'early',
  substitutions: ['pelvis-hikes'],
  confidence: 'fairly-sure',
  handsFelt: '',
  by: coach,
  at,
  beforeFigures: true,
  gates: STANDARD_GATES,
  ...change,
});

export const aReading = (result: ReadingResult, change: Partial<Reading> = {}): Reading => ({
  id: uuid(900),
  visitId,
  side: result.supportSide,
  engine: 1,
  inputHash: result.inputHash,
  seed: Number.parseInt(result.inputHash.slice(0, 8), 16),
  code: result.code,
  label: readingLabel(result.code, result.before60, result.rules.gateFrom),
  change: result.figures?.d ?? null,
  plusMinus: result.figures ? 1.96 * result.figures.uC : null,
  u: result.figures?.uC ?? null,
  pEarly: result.figures?.pEarly ?? null,
  smallestFound: result.figures?.mdt90 ?? null,
  provisional: result.provisional,
  assumption: result.thighTurnsLittle,
  marking: { marks: 270, followed: 0, looked: 0 },
  markError: { px: 3, frames: 0 },
  protocol: { version: 1, at },
  result,
  reps: result.reps.map(({ id }, n) => ({
    id,
    clipId,
    clipName: 'IMG_2291.MOV',
    number: n + 1,
    excluded: null,
    liftFrom: null,
    tieFault: null,
  })),
  by: coach,
  at,
  ...change,
});

export const aSidePage = (reading: Reading | null, change: Partial<SidePage> = {}): SidePage => {
  const side = reading?.side ?? 'right';
  return {
    visit: { id: visitId, day: '2026-03-03' },
    athlete: { id: athleteId, name: 'Ines Marlow' },
    side,
    calls: [aCall({ side })],
    reading,
    newerMarkError: null,
    newerProtocol: null,
    newerEngine: null,
    history: reading
      ? [
          {
            id: reading.id,
            engine: reading.engine,
            code: reading.code,
            label: reading.label,
            change: reading.change,
            plusMinus: reading.plusMinus,
            markError: reading.markError,
            protocol: reading.protocol,
            by: reading.by,
            at: reading.at,
          },
        ]
      : [],
    otherSide: null,
    compared: null,
    agreement: { coach, agreed: 14, of: 17 },
    assumption: reading?.assumption ?? false,
    ...change,
  };
};
