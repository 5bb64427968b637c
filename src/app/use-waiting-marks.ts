import { useEffect } from 'react';

/** Sends marks that an earlier visit to the Bench has left waiting on this device, whatever page is open. */
export function useWaitingMarks(userId: string): void {
  useEffect(() => {
    void import('#src/features/bench/queue/open-queue.ts').then((queue) => {
      queue.markQueueOf(userId);
      queue.secondMarkQueueOf(userId);
    });
  }, [userId]);
}
