import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import type { MarkingCommand } from '#shared/landmarks/commands.ts';
import { emptyHistory, record } from '#shared/landmarks/commands-history.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { frameIndex } from '#shared/timing/units.ts';
import type { BenchStep } from '../store/bench-store.ts';
import { withFollowed } from './join-step.ts';

const command = (n: number, landmark: LandmarkId, u: number): MarkingCommand => ({
  frame: frameIndex(n),
  landmark,
  before: null,
  after: {
    to: 'point',
    point: framePoint(u, 0),
    source: 'hand',
    looked: true,
    confidence: null,
    pictureLongEdge: 1920,
  },
});
const hand: BenchStep = { kind: 'marks', repId: 'a', commands: [command(12, 'belt-tip', 5)] };
const followed = [
  { repId: 'a', commands: [command(11, 'belt-tip', 4), command(13, 'belt-tip', 6)] },
];
const placed = { repId: 'a', landmark: 'belt-tip', frame: frameIndex(12) } as const;

describe('what is followed anew around a mark', () => {
  it('is one step with the mark, which is what is shown when it is taken back', () => {
    const before = record(record(emptyHistory<BenchStep>(), hand), hand);
    const { done } = withFollowed(before, placed, followed);
    expect(done).toEqual([
      hand,
      {
        kind: 'many-marks',
        parts: [{ repId: 'a', commands: hand.commands }, ...followed],
        shown: 12,
      },
    ]);
  });
  it('is a step of its own where the hand did something else meanwhile', () => {
    const other: BenchStep = { ...hand, commands: [command(12, 'kneecap', 5)] };
    for (const before of [emptyHistory<BenchStep>(), record(emptyHistory<BenchStep>(), other)]) {
      const { done } = withFollowed(before, placed, followed);
      expect(done).toEqual([...before.done, { kind: 'many-marks', parts: followed }]);
    }
  });
});
