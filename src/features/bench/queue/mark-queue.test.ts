import { describe, expect, it } from 'vitest';
import type { MarkOutcome, Rep } from '#shared/contracts/reps.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { aRep } from '#tests/support/records.ts';
import { createMarkQueue, type QueueDeps, type SendFailure, type Settled } from './mark-queue.ts';
import type { NewMark, QueuedMark } from './queue-core.ts';
import { memoryStorage } from './queue-storage.ts';

const REP: Rep = { ...aRep(1), id: 'rep', clipId: 'clip', endFrame: 99, markedFrames: 0 };
const mark = (id: string, frame: number): NewMark => ({
  id,
  clipId: 'clip',
  repId: 'rep',
  frame: frameIndex(frame),
  landmark: 'kneecap',
  before: null,
  after: {
    to: 'point',
    point: framePoint(1, 2),
    source: 'hand',
    looked: true,
    confidence: null,
    pictureLongEdge: 1920,
  },
  known: 0,
});
const applied = ({ id, baseRevision }: QueuedMark): MarkOutcome => ({
  id,
  outcome: 'applied',
  mark: null,
  revision: baseRevision + 1,
});

type Answer = Pick<Settled, 'outcomes' | 'rep'> | SendFailure;
const make = (answer: (batch: readonly QueuedMark[]) => Answer, storage = memoryStorage()) => {
  const sent: string[][] = [];
  const timers: (() => void)[] = [];
  let n = 0;
  const deps: QueueDeps = {
    storage,
    send: (batch) => {
      sent.push(batch.map((each) => each.id));
      return Promise.resolve(answer(batch));
    },
    alone: (work) => work(),
    tellTabs: () => undefined,
    newId: () => `new${(n += 1)}`,
    later: (work) => {
      timers.push(work);
      return () => void timers.splice(timers.indexOf(work), 1);
    },
  };
  return { queue: createMarkQueue(deps), sent, timers, storage };
};
const good = (batch: readonly QueuedMark[]): Answer => ({
  outcomes: batch.map(applied),
  rep: REP,
});

/** A promise and what keeps it. */
const later = () => {
  let resolve: () => void = () => undefined;
  const promise = new Promise<void>((keep) => (resolve = keep));
  return { promise, resolve };
};

describe('mark queue', () => {
  it('shows a mark as waiting at once and lets it go when the server has it', async () => {
    const { queue, sent } = make(good);
    const settled: Settled[] = [];
    queue.onSettled((each) => {
      settled.push(each);
      return Promise.resolve();
    });
    const done = queue.add([mark('a', 1)]);
    expect(queue.snapshot().marks.map((each) => each.id)).toEqual(['a']);
    await done;
    expect(queue.snapshot()).toEqual({ marks: [], link: 'idle' });
    expect(sent).toEqual([['a']]);
    expect(settled[0]).toMatchObject({ clipId: 'clip', repId: 'rep', rep: REP });
  });

  it('lets a mark go only after the page shows what is stored, so that it never blinks', async () => {
    const { queue } = make(good);
    const shown = later();
    const answered = later();
    queue.onSettled(() => {
      answered.resolve();
      return shown.promise;
    });
    const done = queue.add([mark('a', 1)]);
    await answered.promise;
    await new Promise((resolve) => setTimeout(resolve));
    expect(queue.snapshot().marks.map((each) => each.id)).toEqual(['a']);
    shown.resolve();
    await done;
    expect(queue.snapshot().marks).toEqual([]);
  });

  it('keeps marks without a connection and sends them when it is back', async () => {
    let connected = false;
    const { queue, sent, timers } = make((batch) => (connected ? good(batch) : { is: 'offline' }));
    await queue.add([mark('a', 1)]);
    await queue.add([mark('b', 2)]);
    expect(queue.snapshot().link).toBe('offline');
    expect(queue.snapshot().marks.map((each) => each.id)).toEqual(['a', 'b']);
    connected = true;
    timers.at(-1)?.();
    await queue.drain();
    expect(queue.snapshot()).toEqual({ marks: [], link: 'idle' });
    expect(sent.at(-1)).toEqual(['a', 'b']);
  });

  it('finds what an earlier tab has left behind', async () => {
    const storage = memoryStorage();
    await make(() => ({ is: 'offline' }), storage).queue.add([mark('a', 1)]);
    const { queue, sent } = make(good, storage);
    await queue.drain();
    expect(sent).toEqual([['a']]);
    expect(await storage.read()).toEqual([]);
  });

  it('remembers, once, that a clip was answered while no page listened', async () => {
    const { queue } = make(good);
    await queue.add([mark('a', 1)]);
    expect(queue.takeMissed('another clip')).toBe(false);
    expect(queue.takeMissed('clip')).toBe(true);
    expect(queue.takeMissed('clip')).toBe(false);
    queue.onSettled(() => Promise.resolve());
    await queue.add([mark('b', 2)]);
    expect(queue.takeMissed('clip')).toBe(false);
  });

  it('waits for a sign-in and loses nothing', async () => {
    const { queue, timers } = make(() => ({ is: 'signed-out' }));
    await queue.add([mark('a', 1)]);
    expect(queue.snapshot().link).toBe('signed-out');
    expect(queue.snapshot().marks).toHaveLength(1);
    expect(timers).toEqual([]);
  });

  it('finds the one bad command among good ones', async () => {
    const { queue } = make((batch) =>
      batch.some((each) => each.id === 'bad')
        ? { is: 'refused', whole: false, reason: 'The clip has no such frame.' }
        : good(batch),
    );
    await queue.add([mark('a', 1), mark('bad', 2), mark('c', 3)]);
    expect(queue.snapshot().marks.map((each) => [each.id, each.state])).toEqual([
      ['bad', { is: 'refused', reason: 'The clip has no such frame.' }],
    ]);
  });

  it('gives up a whole rep that is gone', async () => {
    const { queue, sent } = make(() => ({ is: 'refused', whole: true, reason: 'Deleted.' }));
    await queue.add([mark('a', 1), mark('b', 2)]);
    expect(sent).toHaveLength(1);
    expect(queue.snapshot().marks.map((each) => each.state.is)).toEqual(['refused', 'refused']);
  });

  it('sends what was placed while it was sending', async () => {
    let during = Promise.resolve();
    let first = true;
    const { queue, sent } = make((batch) => {
      if (first) during = queue.add([mark('b', 2)]);
      first = false;
      return good(batch);
    });
    await queue.add([mark('a', 1)]);
    await during;
    await queue.drain();
    expect(sent.flat().sort()).toEqual(['a', 'b']);
    expect(queue.snapshot().marks).toEqual([]);
  });
});
