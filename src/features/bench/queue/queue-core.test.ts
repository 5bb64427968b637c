import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Mark, MarkOutcome } from '#shared/contracts/reps.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import { frameIndex } from '#shared/timing/units.ts';
import {
  countOf,
  enqueue,
  keepMine,
  keyOf,
  letGo,
  type NewMark,
  nextBatch,
  type QueuedMark,
  refreshDispute,
  refuse,
  settle,
} from './queue-core.ts';

const at = (u: number): MarkValue => ({
  to: 'point',
  point: framePoint(u, 5),
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
});
const change = (id: string, u: number, over: Partial<NewMark> = {}): NewMark => ({
  id,
  clipId: 'clip',
  repId: 'rep',
  frame: frameIndex(12),
  landmark: 'kneecap',
  before: null,
  after: at(u),
  known: 0,
  ...over,
});
const theirs = (u: number, revision: number): Mark => ({
  frame: 12,
  landmark: 'kneecap',
  u,
  v: 5,
  hidden: false,
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
  revision,
  by: { id: '0', name: 'Tobias Lindqvist' },
  at: '2026-03-03T16:25:00Z',
});
const answer = (
  id: string,
  outcome: MarkOutcome['outcome'],
  mark: Mark | null,
  revision: number,
): MarkOutcome => ({ id, outcome, mark, revision });
const counter = () => {
  let n = 0;
  return () => `new${(n += 1)}`;
};
const of = (...marks: NewMark[]) =>
  marks.reduce<readonly QueuedMark[]>((queue, mark) => enqueue(queue, mark), []);

describe('enqueue', () => {
  it('counts the revisions of what waits before it', () => {
    const queue = of(
      change('a', 1, { known: 3, before: at(0) }),
      change('b', 2, { known: 3, before: at(1) }),
      change('c', 9, { landmark: 'belt-tip' }),
    );
    expect(queue.map((each) => [each.id, each.baseRevision])).toEqual([
      ['a', 3],
      ['b', 4],
      ['c', 0],
    ]);
  });
});

describe('nextBatch', () => {
  it('sends one rep at a time, in order, up to the limit', () => {
    const queue = of(
      change('a', 1),
      change('b', 2, { repId: 'other' }),
      change('c', 3, { landmark: 'belt-tip' }),
      change('d', 4, { landmark: 'thigh-tip' }),
    );
    expect(nextBatch(queue, 2).map((each) => each.id)).toEqual(['a', 'c']);
    expect(nextBatch([], 2)).toEqual([]);
  });
});

describe('settle', () => {
  it('lets go of what the server has, also when it had it before', () => {
    const queue = of(change('a', 1), change('b', 2, { before: at(1) }));
    const left = settle(
      queue,
      [answer('a', 'applied', theirs(1, 1), 1), answer('b', 'already-applied', theirs(2, 2), 2)],
      counter(),
    );
    expect(left).toEqual([]);
  });

  it('keeps both marks where somebody else was first', () => {
    const left = settle(
      of(change('a', 1, { known: 1, before: at(0) })),
      [answer('a', 'conflict', theirs(7, 2), 2)],
      counter(),
    );
    expect(left).toHaveLength(1);
    expect(left[0]).toMatchObject({
      id: 'new1',
      after: { point: { u: 1 } },
      state: { is: 'disputed', theirs: { u: 7, revision: 2 }, revision: 2 },
    });
    expect(countOf(left)).toEqual({ waiting: 0, disputed: 1, refused: 0 });
  });

  it('stands for the newest of several own changes', () => {
    const left = settle(
      of(change('a', 1, { known: 1, before: at(0) }), change('b', 2, { before: at(1) })),
      [answer('a', 'conflict', theirs(7, 2), 2), answer('b', 'conflict', theirs(7, 2), 2)],
      counter(),
    );
    expect(left.map((each) => each.after)).toEqual([at(2)]);
    expect(left[0]?.state.is).toBe('disputed');
  });

  it('is no dispute where both have put it on the same point', () => {
    const left = settle(of(change('a', 7)), [answer('a', 'conflict', theirs(7, 1), 1)], counter());
    expect(left).toEqual([]);
  });

  it('sends again by itself where a removed mark only made the count go on', () => {
    const left = settle(of(change('a', 1)), [answer('a', 'conflict', null, 4)], counter());
    expect(left).toEqual([
      expect.objectContaining({ id: 'new1', baseRevision: 4, state: { is: 'waiting' } }),
    ]);
  });

  it('asks where they took away what this person moved', () => {
    const left = settle(
      of(change('a', 1, { known: 3, before: at(0) })),
      [answer('a', 'conflict', null, 4)],
      counter(),
    );
    expect(left[0]?.state).toEqual({ is: 'disputed', theirs: null, revision: 4 });
  });

  it('passes over answers to what it no longer knows', () => {
    const queue = of(change('a', 1));
    expect(settle(queue, [answer('gone', 'applied', null, 1)], counter())).toEqual(queue);
  });
});

describe('deciding', () => {
  const disputed = settle(
    of(change('a', 1, { known: 1, before: at(0) })),
    [answer('a', 'conflict', theirs(7, 2), 2)],
    counter(),
  );

  it('keeps mine by sending it over theirs', () => {
    const [mine] = keepMine(disputed, 'new1', () => 'again');
    expect(mine).toMatchObject({ id: 'again', baseRevision: 2, state: { is: 'waiting' } });
  });

  it('keeps theirs by letting mine go', () => {
    expect(letGo(disputed, new Set(['new1']))).toEqual([]);
  });

  it('a further own change stays in the dispute', () => {
    const next = enqueue(disputed, change('c', 3, { before: at(1) }));
    expect(next).toHaveLength(1);
    expect(next[0]).toMatchObject({ id: 'c', after: { point: { u: 3 } } });
    expect(next[0]?.state.is).toBe('disputed');
  });

  it('shows theirs as it is now', () => {
    const key = keyOf(change('a', 1));
    const [now] = refreshDispute(disputed, key, theirs(8, 3));
    expect(now?.state).toMatchObject({ theirs: { u: 8 }, revision: 3 });
    expect(refreshDispute(disputed, key, theirs(9, 1))).toEqual(disputed);
  });
});

describe('refuse', () => {
  it('keeps the mark and says why', () => {
    const left = refuse(of(change('a', 1)), new Set(['a']), 'The rep was deleted.');
    expect(left[0]?.state).toEqual({ is: 'refused', reason: 'The rep was deleted.' });
    expect(nextBatch(left, 10)).toEqual([]);
  });
});

describe('with an honest server', () => {
  it('every run of changes ends with the newest value stored and nothing left', () => {
    const wish = fc.record({
      landmark: fc.constantFrom('kneecap' as const, 'belt-tip' as const),
      u: fc.option(fc.nat(50)),
      cut: fc.boolean(),
    });
    fc.assert(
      fc.property(fc.array(wish, { maxLength: 30 }), (wishes) => {
        // the server: counts revisions, remembers commands, a removed mark goes on counting
        const stored = new Map<string, { u: number | null; revision: number }>();
        const done = new Set<string>();
        const serve = (each: QueuedMark): MarkOutcome => {
          const key = each.landmark;
          const now = stored.get(key) ?? { u: null, revision: 0 };
          const told = (outcome: MarkOutcome['outcome']) => {
            const then = stored.get(key) ?? now;
            const mark = then.u === null ? null : theirs(then.u, then.revision);
            return answer(each.id, outcome, mark, then.revision);
          };
          if (done.has(each.id)) return told('already-applied');
          if (now.revision > each.baseRevision) return told('conflict');
          done.add(each.id);
          const u = each.after?.to === 'point' ? each.after.point.u : null;
          stored.set(key, { u, revision: now.revision + 1 });
          return told('applied');
        };
        const newId = counter();
        let queue: readonly QueuedMark[] = [];
        const newest = new Map<string, number | null>();
        for (const [n, { landmark, u, cut }] of wishes.entries()) {
          const seen = newest.get(landmark) ?? null;
          // a gesture that changes nothing makes no command
          if (seen === u) continue;
          const known = stored.get(landmark);
          queue = enqueue(
            queue,
            change(`w${n}`, 0, {
              landmark,
              before: seen === null ? null : at(seen),
              after: u === null ? null : at(u),
              // a mark that is gone is no longer in the document: its count is not known
              known: known && known.u !== null ? known.revision : 0,
            }),
          );
          newest.set(landmark, u);
          // the connection is cut after the server has done it and before it could say so
          if (cut) nextBatch(queue, 3).forEach(serve);
          else if (n % 3 === 2) queue = settle(queue, nextBatch(queue, 9).map(serve), newId);
        }
        for (let round = 0; round < 200 && nextBatch(queue, 9).length > 0; round += 1)
          queue = settle(queue, nextBatch(queue, 9).map(serve), newId);
        const disputed = new Set(
          queue.filter((each) => each.state.is === 'disputed').map((each) => each.landmark),
        );
        expect(countOf(queue).waiting).toBe(0);
        for (const [landmark, u] of newest)
          if (![...disputed].some((each) => each === landmark))
            expect(stored.get(landmark)?.u ?? null).toBe(u);
        // one person alone never disagrees with themself
        expect(disputed.size).toBe(0);
      }),
      { numRuns: 1000, seed: 20260718 },
    );
  });
});
