import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { secondMarkingOptions } from '#src/api/reliability.queries.ts';
import { marksAfter } from '../actions/bench-cache.ts';
import type { MarkQueue } from '../queue/mark-queue.ts';

/** The query cache tells its pages in a task of its own, the one after this: then they show what was set. */
const nextTask = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

/** Puts what the server has answered to the queue into the document of the second marking. */
export function useBlindLive(id: string, queue: MarkQueue): void {
  const client = useQueryClient();
  useEffect(
    () =>
      queue.onSettled(async ({ repId, outcomes, touched }) => {
        if (repId !== id) return;
        client.setQueryData(
          secondMarkingOptions(id).queryKey,
          (known) => known && { ...known, marks: marksAfter(known.marks, outcomes, touched) },
        );
        await nextTask();
      }),
    [client, queue, id],
  );
}
