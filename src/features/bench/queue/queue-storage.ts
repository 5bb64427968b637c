import { type DBSchema, openDB } from 'idb';
import type { QueuedMark } from './queue-core.ts';

/** Where a person's queue is kept. `change` is one step that no other tab can come between. */
export interface QueueStorage {
  read(): Promise<readonly QueuedMark[]>;
  change(
    step: (queue: readonly QueuedMark[]) => readonly QueuedMark[],
  ): Promise<readonly QueuedMark[]>;
}

interface Schema extends DBSchema {
  /** By user: a queue belongs to the person who made it, whoever is signed in now. */
  marks: { key: string; value: readonly QueuedMark[] };
}

const open = () =>
  openDB<Schema>('redshank-bench', 1, {
    upgrade: (database) => void database.createObjectStore('marks'),
  });

export const browserStorage = (userId: string): QueueStorage => {
  let database: ReturnType<typeof open> | null = null;
  const connect = () => (database ??= open());
  return {
    async read() {
      return (await (await connect()).get('marks', userId)) ?? [];
    },
    async change(step) {
      const transaction = (await connect()).transaction('marks', 'readwrite', {
        durability: 'strict',
      });
      const next = step((await transaction.store.get(userId)) ?? []);
      if (next.length === 0) await transaction.store.delete(userId);
      else await transaction.store.put(next, userId);
      await transaction.done;
      return next;
    },
  };
};

/** For a browser that keeps nothing (private windows of some): lasts as long as the tab. */
export const memoryStorage = (): QueueStorage => {
  let queue: readonly QueuedMark[] = [];
  return {
    read: () => Promise.resolve(queue),
    change(step) {
      queue = step(queue);
      return Promise.resolve(queue);
    },
  };
};
