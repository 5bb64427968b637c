import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { emptyHistory, record, stepAgain, stepBack } from './commands-history.ts';
import { hide, lookedAt, nudge, place, remove, removeFrame } from './commands-make.ts';
import {
  applyMarking,
  inverseOf,
  markAt,
  type MarkingCommand,
  type MarksByFrame,
  NO_MARKS,
  stillAsLeft,
} from './commands.ts';
import { LANDMARK_IDS } from './types.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const F = frameIndex(12);
const at = (u: number, v: number) => ({
  frame: F,
  landmark: 'kneecap' as const,
  point: framePoint(u, v),
  pictureLongEdge: 1920,
});
const byHand = (u: number, v: number) => ({
  to: 'point',
  point: { u, v },
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
});

describe('placing', () => {
  it('puts a mark, and its inverse takes it away again', () => {
    const commands = place(NO_MARKS, at(10, 20));
    const marks = applyMarking(NO_MARKS, commands);
    expect(markAt(marks, F, 'kneecap')).toEqual(byHand(10, 20));
    expect(applyMarking(marks, inverseOf(commands))).toEqual(NO_MARKS);
  });

  it('is no command where nothing would change', () => {
    const marks = applyMarking(NO_MARKS, place(NO_MARKS, at(10, 20)));
    expect(place(marks, at(10, 20))).toEqual([]);
  });

  it('leaves the marks it was given untouched', () => {
    const before = applyMarking(NO_MARKS, place(NO_MARKS, at(1, 1)));
    applyMarking(before, place(before, at(2, 2)));
    expect(markAt(before, F, 'kneecap')).toEqual(byHand(1, 1));
  });
});

describe('hiding, nudging, removing', () => {
  const marked = applyMarking(NO_MARKS, place(NO_MARKS, at(10, 20)));

  it('hides a mark and brings its place back', () => {
    const commands = hide(marked, F, 'kneecap');
    const hidden = applyMarking(marked, commands);
    expect(markAt(hidden, F, 'kneecap')).toEqual({ to: 'hidden' });
    expect(applyMarking(hidden, inverseOf(commands))).toEqual(marked);
  });

  it('nudges by a tenth of a pixel', () => {
    const moved = applyMarking(marked, nudge(marked, F, 'kneecap', { du: 0.1, dv: 0 }, 1920));
    expect(markAt(moved, F, 'kneecap')).toEqual(byHand(10.1, 20));
  });

  it('cannot nudge what is not there or hidden', () => {
    expect(nudge(marked, F, 'belt-tip', { du: 1, dv: 0 }, 1920)).toEqual([]);
    const hidden = applyMarking(marked, hide(marked, F, 'kneecap'));
    expect(nudge(hidden, F, 'kneecap', { du: 1, dv: 0 }, 1920)).toEqual([]);
  });

  it('forgets a frame whose last mark is removed', () => {
    expect(applyMarking(marked, remove(marked, F, 'kneecap')).has(F)).toBe(false);
    expect(removeFrame(marked, F)).toHaveLength(1);
  });

  it('makes tracked marks solid once somebody has looked', () => {
    const tracked: MarksByFrame = new Map([
      [
        F,
        {
          kneecap: {
            to: 'point',
            point: framePoint(1, 2),
            source: 'tracked',
            looked: false,
            confidence: 0.9,
            pictureLongEdge: 1920,
          },
          'belt-tip': { to: 'hidden' },
        },
      ],
    ]);
    const commands = lookedAt(tracked, F);
    expect(commands.map((each) => each.landmark)).toEqual(['kneecap']);
    const looked = markAt(applyMarking(tracked, commands), F, 'kneecap');
    expect(looked).toMatchObject({ source: 'tracked', looked: true, confidence: 0.9 });
  });
});

describe('taking back', () => {
  it('any run of commands is undone by its inverse', () => {
    const value = fc.option(
      fc.oneof(
        fc.constant({ to: 'hidden' as const }),
        fc.record({
          to: fc.constant('point' as const),
          point: fc.record({ u: fc.nat(2000), v: fc.nat(2000) }),
          source: fc.constantFrom('hand' as const, 'tracked' as const),
          looked: fc.boolean(),
          confidence: fc.constant(null),
          pictureLongEdge: fc.constant(1920),
        }),
      ),
    );
    const wish = fc.record({
      frame: fc.nat(3).map(frameIndex),
      landmark: fc.constantFrom(...LANDMARK_IDS),
      after: value,
    });
    fc.assert(
      fc.property(fc.array(wish), fc.array(wish), (first, then) => {
        const run = (start: MarksByFrame, wishes: typeof first) => {
          const done: MarkingCommand[] = [];
          let marks = start;
          for (const each of wishes) {
            const command = { ...each, before: markAt(marks, each.frame, each.landmark) };
            done.push(command);
            marks = applyMarking(marks, [command]);
          }
          return { marks, done };
        };
        const start = run(NO_MARKS, first).marks;
        const { marks, done } = run(start, then);
        expect(stillAsLeft(marks, done)).toBe(true);
        expect(applyMarking(marks, inverseOf(done))).toEqual(start);
      }),
    );
  });

  it('notices that somebody else moved the mark since', () => {
    const commands = place(NO_MARKS, at(10, 20));
    const marks = applyMarking(NO_MARKS, commands);
    const theirs = applyMarking(marks, place(marks, at(11, 20)));
    expect(stillAsLeft(marks, commands)).toBe(true);
    expect(stillAsLeft(theirs, commands)).toBe(false);
  });
});

describe('history', () => {
  it('goes back to the moment of opening and forward again', () => {
    const two = record(record(emptyHistory<string>(), 'a'), 'b');
    const back = stepBack(two);
    expect(back?.[0]).toBe('b');
    const further = back && stepBack(back[1]);
    expect(further?.[0]).toBe('a');
    expect(further && stepBack(further[1])).toBeNull();
    expect(further && stepAgain(further[1])).toEqual(['a', { done: ['a'], undone: ['b'] }]);
  });

  it('a new step ends redo', () => {
    const back = stepBack(record(emptyHistory<string>(), 'a'));
    const next = record(back?.[1] ?? emptyHistory(), 'c');
    expect(next).toEqual({ done: ['c'], undone: [] });
    expect(stepAgain(next)).toBeNull();
  });
});
