import { describe, expect, it } from 'vitest';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { markedRep } from '#tests/fixtures/clips/marked.ts';
import { type ClipTruth, parseTruth } from '#tests/fixtures/clips/truth.ts';
import { CLIPS } from '../clips.ts';
import { makeTake } from './take.ts';
import { clipTruth } from './truth.ts';

const truthOf = (name: string): ClipTruth => {
  const clip = CLIPS.find((plan) => plan.name === name);
  if (clip === undefined) throw new Error(`no clip ${name}`);
  return parseTruth(clipTruth(makeTake(clip)));
};

const readingOf = (truth: ClipTruth, supportSide: 'left' | 'right', sd: number): ReadingResult =>
  deriveReading({
    engine: 1,
    supportSide,
    set: null,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: truth.reps.flatMap((rep, index) =>
      rep.supportSide === supportSide ? [markedRep(truth, index, sd, 5)] : [],
    ),
  });

const meanChange = (truth: ClipTruth, side: 'left' | 'right'): number => {
  const changes = truth.reps.flatMap((rep) =>
    rep.supportSide === side && rep.turnChange60To90 !== null ? [rep.turnChange60To90] : [],
  );
  return changes.reduce((sum, change) => sum + change, 0) / changes.length;
};

/** Two thousand draws a rep take their time on a busy machine. */
const PATIENCE_MS = 60_000;

describe('what the product reads from the clips', { timeout: PATIENCE_MS }, () => {
  it.each([
    ['right-early', 'right', 'belt+thigh', 'early-turn-out'],
    ['left-expected', 'left', 'belt+thigh', 'expected-turn-in'],
    ['both-sides', 'right', 'belt+thigh', 'early-turn-out'],
    ['both-sides', 'left', 'belt+thigh', 'expected-turn-in'],
    ['right-still', 'right', 'belt+thigh', 'holds-still'],
  ] as const)('%s, %s support: %s says %s', (name, side, set, code) => {
    const truth = truthOf(name);
    const marked = readingOf(truth, side, 3);
    expect(marked.set).toBe(set);
    expect(marked.code).toBe(code);
    expect(Math.abs((marked.figures?.d ?? NaN) - meanChange(truth, side))).toBeLessThan(
      1.96 * (marked.figures?.uC ?? NaN),
    );
  });

  it('short-lift stops short', () => {
    expect(readingOf(truthOf('short-lift'), 'left', 3).code).toBe('lift-stops-short');
  });

  it('bare-still claims no turn: bare landmarks cannot tell so little', () => {
    const reading = readingOf(truthOf('bare-still'), 'right', 3);
    expect(reading.set).toBe('bare');
    expect(['holds-still', 'cannot-tell']).toContain(reading.code);
  });
});
