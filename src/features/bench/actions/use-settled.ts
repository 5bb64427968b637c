import { type DataTag, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { MarkQueue, Settled } from '../queue/mark-queue.ts';
import { useNewest } from '../use-newest.ts';

/** The query cache tells its pages in a task of its own, the one after this: then they show what was set. */
const nextTask = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

/**
 * Merges what the server answers to the queue into the cached document of a clip. `merge` gives null
 * where an answer is about something else. A document that was being read meanwhile, or was read before
 * marks of an earlier visit were stored, is read anew.
 */
export function useSettled<Document>(
  queue: MarkQueue,
  clipId: string,
  queryKey: DataTag<readonly unknown[], Document, Error>,
  merge: (known: Document, settled: Settled) => Document | null,
): void {
  const client = useQueryClient();
  const newest = useNewest({ queryKey, merge });
  useEffect(() => {
    const readAnew = () => void client.invalidateQueries({ queryKey: newest.current.queryKey });
    const stop = queue.onSettled(async (settled) => {
      if (settled.clipId !== clipId) return;
      const { queryKey: key, merge: into } = newest.current;
      client.setQueryData(key, (known: Document | undefined) =>
        known === undefined ? undefined : (into(known, settled) ?? known),
      );
      if (client.isFetching({ queryKey: key }) > 0) readAnew();
      await nextTask();
    });
    if (queue.takeMissed(clipId)) readAnew();
    return stop;
  }, [client, queue, clipId, newest]);
}
