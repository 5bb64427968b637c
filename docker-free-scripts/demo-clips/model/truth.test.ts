import { describe, expect, it } from 'vitest';
import { type ClipTruth, parseTruth } from '#tests/fixtures/clips/truth.ts';
import { CLIPS } from '../clips.ts';
import { plainReading } from './plain-reading.ts';
import { makeTake } from './take.ts';
import { clipTruth } from './truth.ts';

const front = CLIPS.filter((clip) => clip.view === 'front').map((clip): [string, ClipTruth] => [
  clip.name,
  parseTruth(clipTruth(makeTake(clip))),
]);

const frames = (truth: ClipTruth, from: number, to: number) => truth.frames.slice(from, to + 1);

describe.each(front)('true pixels of %s', (_name, truth) => {
  it('give back the true lift within 1.5° between 45° and the top', () => {
    for (const rep of truth.reps) {
      const read = plainReading(truth, rep);
      const rise = frames(truth, rep.footOffFrame, rep.plateauEndFrame);
      const worst = Math.max(
        ...rise
          .filter((frame) => frame.values.lift > 45)
          .map((frame) => Math.abs(read(frame).lift - frame.values.lift)),
      );
      expect(worst).toBeLessThan(1.5);
    }
  });

  it('give back the true turn since quiet stance within 0.6°', () => {
    for (const rep of truth.reps) {
      const read = plainReading(truth, rep);
      const quiet = frames(truth, ...rep.quietFrames);
      const zero = quiet.reduce((sum, frame) => sum + frame.values.turn, 0) / quiet.length;
      for (const frame of frames(truth, rep.footOffFrame, rep.plateauEndFrame)) {
        const { turn, bareTurn } = read(frame);
        expect(Math.abs(bareTurn - (frame.values.turn - zero))).toBeLessThan(0.6);
        if (truth.setUp.beltPointerMm !== null)
          expect(Math.abs(turn - (frame.values.turn - zero))).toBeLessThan(0.6);
      }
    }
  });

  it('stand in the order of a rep, with enough quiet frames', () => {
    for (const rep of truth.reps) {
      expect(rep.quietFrames[1] - rep.quietFrames[0]).toBeGreaterThan(20);
      const order = [
        rep.firstFrame,
        rep.quietFrames[1],
        rep.footOffFrame,
        rep.topFrame,
        rep.footDownFrame,
        rep.lastFrame,
      ];
      expect(order).toEqual([...order].sort((a, b) => a - b));
      expect(rep.plateauEndFrame).toBeGreaterThanOrEqual(rep.topFrame);
    }
  });

  it('keep the quiet pelvis in place and the quiet thigh upright', () => {
    for (const rep of truth.reps) {
      const quiet = frames(truth, ...rep.quietFrames);
      const middle = quiet.map(
        ({ marks }) =>
          ((marks['asis-support']?.[0] ?? NaN) + (marks['asis-lifted']?.[0] ?? NaN)) / 2,
      );
      expect((Math.max(...middle) - Math.min(...middle)) * truth.setUp.mmPerPx).toBeLessThan(15);
      expect(Math.max(...quiet.map((frame) => Math.abs(frame.values.lift)))).toBeLessThan(4);
    }
  });
});

describe('what each clip shows', () => {
  const changes = (name: string, side: 'left' | 'right') =>
    (front.find(([clip]) => clip === name)?.[1].reps ?? [])
      .filter((rep) => rep.supportSide === side)
      .map((rep) => rep.turnChange60To90);

  it.each([
    ['right-early', 'right', 7, 10],
    ['left-expected', 'left', -10, -7],
    ['both-sides', 'right', 7, 10],
    ['both-sides', 'left', -10, -7],
    ['bare-still', 'right', -1, 1],
  ] as const)(
    '%s, %s support: change from 60° to 90° within %d and %d',
    (name, side, low, high) => {
      const found = changes(name, side);
      expect(found).toHaveLength(3);
      for (const change of found) {
        expect(change).toBeGreaterThan(low);
        expect(change).toBeLessThan(high);
      }
    },
  );

  it('short-lift never reaches 85°', () => {
    const truth = front.find(([clip]) => clip === 'short-lift')?.[1];
    expect(truth?.reps.map((rep) => rep.turnChange60To90)).toEqual([null, null, null]);
    expect(Math.max(...(truth?.reps.map((rep) => rep.maxLift) ?? []))).toBeLessThan(80);
  });
});

describe('the lifted side', () => {
  it('shows the lift as the angle of trochanter to knee, within 1.5°', () => {
    const clip = CLIPS.find(({ view }) => view === 'lifted-side');
    if (clip === undefined) throw new Error('no clip from the side');
    const truth = parseTruth(clipTruth(makeTake(clip)));
    const seen = truth.frames.map(({ marks }) => {
      const [trochanter, knee] = [
        marks['trochanter'] ?? [NaN, NaN],
        marks['knee-lateral'] ?? [NaN, NaN],
      ];
      // the person faces the picture's left
      return (Math.atan2(trochanter[0] - knee[0], knee[1] - trochanter[1]) * 180) / Math.PI;
    });
    const still = seen[truth.reps[0]?.quietFrames[0] ?? 0] ?? NaN;
    for (const frame of truth.frames)
      expect(Math.abs((seen[frame.index] ?? NaN) - still - frame.values.lift)).toBeLessThan(1.5);
  });
});
