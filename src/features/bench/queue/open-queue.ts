import { guardLeaving } from '#src/api/leaving.ts';
import { inWords, capital } from '#src/ui/figures.ts';
import { createMarkQueue, type MarkQueue, type Settled } from './mark-queue.ts';
import { newId } from './new-id.ts';
import { countOf } from './queue-core.ts';
import { browserStorage, memoryStorage } from './queue-storage.ts';
import { sendMarks } from './send-marks.ts';
import { sendSecondMarks } from './send-second-marks.ts';

/** What a queue holds: the marks of reps, or second marks. They are kept and sent apart. */
type Kind = 'marks' | 'second-marks';
const SENDS = { marks: sendMarks, 'second-marks': sendSecondMarks } as const;

const queues = new Map<string, MarkQueue>();
/** Only the marks of the person who is signed in now are asked about at sign-out. */
let current: string | null = null;

/** Locks want https or this machine; without them a single tab is the rule. */
const alone = (name: string) => async (work: () => Promise<void>) => {
  if ('locks' in navigator) await navigator.locks.request(name, work);
  else await work();
};

/**
 * The queue of one person in this browser. It belongs to the person, not to the session: it outlives
 * an expired sign-in and a reload, and is sent by one tab at a time.
 */
export const markQueueOf = (userId: string): MarkQueue => queueOf('marks', userId);

/** The same for marks of second markings. */
export const secondMarkQueueOf = (userId: string): MarkQueue => queueOf('second-marks', userId);

const queueOf = (kind: Kind, userId: string): MarkQueue => {
  current = userId;
  const name = `redshank-${kind}-${userId}`;
  const known = queues.get(name);
  if (known) return known;
  // under which name the browser keeps it
  const place = kind === 'marks' ? userId : `${kind} ${userId}`;
  const channel = 'BroadcastChannel' in window ? new BroadcastChannel(name) : null;
  const queue = createMarkQueue({
    storage: 'indexedDB' in window ? browserStorage(place) : memoryStorage(),
    send: SENDS[kind],
    alone: alone(name),
    tellTabs: (settled) => channel?.postMessage(settled),
    newId,
    later(work, ms) {
      const timer = setTimeout(work, ms);
      return () => clearTimeout(timer);
    },
  });
  queues.set(name, queue);
  channel?.addEventListener('message', (event: MessageEvent<Settled | null>) => {
    void queue.heard(event.data);
  });
  window.addEventListener('online', () => void queue.drain());
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') void queue.drain();
  });
  guardLeaving({
    wouldLose: () => Promise.resolve(current === userId ? sentence(queue) : null),
    // asked for and agreed to: nothing of this person may be left on a shared device
    discard: () => {
      if (current === userId) void queue.letGo(queue.snapshot().marks.map((each) => each.id));
    },
  });
  void queue.drain();
  return queue;
};

const sentence = (queue: MarkQueue): string | null => {
  const { waiting, disputed } = countOf(queue.snapshot().marks);
  const count = waiting + disputed;
  if (count === 0) return null;
  const marks = count === 1 ? 'mark is' : 'marks are';
  return `${capital(inWords(count))} ${marks} not sent yet. Signing out takes them off this device.`;
};
