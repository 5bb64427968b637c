import { secondMarkingOptions } from '#src/api/reliability.queries.ts';
import { marksAfter } from '../actions/bench-cache.ts';
import { useSettled } from '../actions/use-settled.ts';
import type { MarkQueue } from '../queue/mark-queue.ts';

/** Puts what the server has answered to the queue into the document of the second marking. */
export function useBlindLive(id: string, clipId: string, queue: MarkQueue): void {
  useSettled(
    queue,
    clipId,
    secondMarkingOptions(id).queryKey,
    (known, { repId, outcomes, touched }) =>
      repId === id ? { ...known, marks: marksAfter(known.marks, outcomes, touched) } : null,
  );
}
