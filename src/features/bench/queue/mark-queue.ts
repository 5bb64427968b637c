import type { Mark, MarkOutcome, Rep } from '#shared/contracts/reps.ts';
import {
  enqueueAll,
  keepMine,
  letGo,
  type NewMark,
  nextBatch,
  type QueuedMark,
  refreshDispute,
  refuse,
  settle,
} from './queue-core.ts';
import type { QueueStorage } from './queue-storage.ts';

/** What the way to the server is like. */
export type QueueLink = 'idle' | 'sending' | 'offline' | 'trouble' | 'signed-out';

export interface QueueSnapshot {
  readonly marks: readonly QueuedMark[];
  readonly link: QueueLink;
}

export interface Settled {
  readonly clipId: string;
  readonly repId: string;
  readonly outcomes: readonly MarkOutcome[];
  /** The rep as it stands now; null for second marks, which change none. */
  readonly rep: Rep | null;
  /** By command, the mark it was about: an answer may say that nothing is stored. */
  readonly touched: ReadonlyMap<string, Pick<Mark, 'frame' | 'landmark'>>;
}

/** How a sending failed: later again, after a sign-in, or never, for this reason. */
export type SendFailure =
  | { readonly is: 'offline' | 'trouble' | 'signed-out' }
  | { readonly is: 'refused'; readonly whole: boolean; readonly reason: string };

export interface QueueDeps {
  readonly storage: QueueStorage;
  readonly send: (
    batch: readonly QueuedMark[],
  ) => Promise<Pick<Settled, 'outcomes' | 'rep'> | SendFailure>;
  /** Runs `work` while no other tab of this person does; they wait for each other. */
  readonly alone: (work: () => Promise<void>) => Promise<void>;
  /** Tells the person's other tabs that the kept queue has changed. */
  readonly tellTabs: (settled: Settled | null) => void;
  readonly newId: () => string;
  /** Calls back later; answers how to call it off. */
  readonly later: (work: () => void, ms: number) => () => void;
}

export type SettledListener = (settled: Settled) => Promise<void>;

export interface MarkQueue {
  readonly snapshot: () => QueueSnapshot;
  readonly subscribe: (listener: () => void) => () => void;
  /** What waited is dropped only after every listener is done: by then the page shows what is stored. */
  readonly onSettled: (listener: SettledListener) => () => void;
  /** Whether marks of the clip were answered while no page listened; its page asks once and reads anew. */
  readonly takeMissed: (clipId: string) => boolean;
  readonly add: (marks: readonly NewMark[]) => Promise<void>;
  readonly keepMine: (id: string) => Promise<void>;
  readonly letGo: (ids: readonly string[]) => Promise<void>;
  /** The stored mark of a disputed one has changed again. */
  readonly theirsNow: (key: string, mark: Mark) => Promise<void>;
  /** Sends what waits. Called by itself after every change and when the connection comes back. */
  readonly drain: () => Promise<void>;
  /** Another tab has changed the kept queue, or the server has answered it. */
  readonly heard: (settled: Settled | null) => Promise<void>;
}

const BATCH = 500;
const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 60_000;

type Step = (queue: readonly QueuedMark[]) => readonly QueuedMark[];

export const createMarkQueue = (deps: QueueDeps): MarkQueue => {
  const { storage, send, alone, tellTabs, newId, later } = deps;
  let kept: readonly QueuedMark[] = [];
  /** Steps that are not kept yet: shown at once all the same. */
  const pending: Step[] = [];
  let link: QueueLink = 'idle';
  let shown: QueueSnapshot = { marks: [], link };
  const listeners = new Set<() => void>();
  const settledListeners = new Set<SettledListener>();
  const missed = new Set<string>();
  let wait = FIRST_WAIT_MS;
  let callOff: (() => void) | null = null;
  let draining: Promise<void> | null = null;
  let again = false;

  const show = () => {
    shown = { marks: pending.reduce((queue, step) => step(queue), kept), link };
    for (const listener of listeners) listener();
  };
  const setLink = (next: QueueLink) => {
    if (link === next) return;
    link = next;
    show();
  };
  const change = async (step: Step) => {
    pending.push(step);
    show();
    try {
      kept = await storage.change(step);
    } finally {
      pending.splice(pending.indexOf(step), 1);
      show();
    }
  };
  const reload = async () => {
    kept = await storage.read();
    show();
  };
  const tell = async (settled: Settled) => {
    if (settledListeners.size === 0) missed.add(settled.clipId);
    await Promise.all([...settledListeners].map((listener) => listener(settled)));
  };

  const tryLater = (failure: 'offline' | 'trouble') => {
    setLink(failure);
    callOff?.();
    callOff = later(() => void drain(), wait);
    wait = Math.min(wait * 2, LONGEST_WAIT_MS);
  };

  const sendAll = async () => {
    let limit = BATCH;
    for (;;) {
      await reload();
      const batch = nextBatch(kept, limit);
      const first = batch[0];
      if (!first) return setLink('idle');
      setLink('sending');
      const answer = await send(batch);
      if ('outcomes' in answer) {
        wait = FIRST_WAIT_MS;
        const ids = answer.outcomes.map(newId);
        const touched = new Map(batch.map((each) => [each.id, each]));
        const settled = { clipId: first.clipId, repId: first.repId, touched, ...answer };
        // the page first learns what is stored, then what no longer waits: nothing flickers
        await tell(settled);
        await change((queue) => {
          const fresh = ids.values();
          return settle(queue, answer.outcomes, () => fresh.next().value ?? newId());
        });
        tellTabs(settled);
      } else if (answer.is === 'refused') {
        // one bad command refuses its whole batch: find it by sending them one by one
        if (batch.length > 1 && !answer.whole) limit = 1;
        else {
          const ids = new Set(batch.map((each) => each.id));
          await change((queue) => refuse(queue, ids, answer.reason));
          tellTabs(null);
        }
      } else if (answer.is === 'signed-out') return setLink('signed-out');
      else return tryLater(answer.is);
    }
  };

  const drain = (): Promise<void> => {
    if (draining) {
      again = true;
      return draining;
    }
    callOff?.();
    callOff = null;
    draining = alone(sendAll).finally(() => {
      draining = null;
      if (!again) return;
      again = false;
      void drain();
    });
    return draining;
  };

  const act = async (step: Step) => {
    await change(step);
    tellTabs(null);
    await drain();
  };

  return {
    snapshot: () => shown,
    subscribe(listener) {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
    onSettled(listener) {
      settledListeners.add(listener);
      return () => void settledListeners.delete(listener);
    },
    takeMissed: (clipId) => missed.delete(clipId),
    add: (marks) => act((queue) => enqueueAll(queue, marks)),
    keepMine(id) {
      const fresh = newId();
      return act((queue) => keepMine(queue, id, () => fresh));
    },
    letGo: (ids) => act((queue) => letGo(queue, new Set(ids))),
    theirsNow: (key, mark) => change((queue) => refreshDispute(queue, key, mark)),
    drain,
    async heard(settled) {
      if (settled) await tell(settled);
      await reload();
    },
  };
};
