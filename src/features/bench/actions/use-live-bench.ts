import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { LiveEvent } from '#shared/contracts/events.ts';
import { benchOptions } from '#src/api/bench.queries.ts';
import { useMe } from '#src/api/me.ts';
import { useLiveEvents } from '#src/api/use-live.ts';
import { keyOf } from '../queue/queue-core.ts';
import type { MarkQueue } from '../queue/mark-queue.ts';
import { isLandmark } from '#shared/records/stored-marks.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { withOutcomes } from './bench-cache.ts';
import { useSettled } from './use-settled.ts';

/** An own mark whose event comes later than this after the last answer was placed elsewhere. */
const OWN_ECHO_MS = 5_000;

/**
 * Keeps the document true: answers to the own queue go straight into the cache; changes that this
 * person made on another device are asked for; disputes show what is stored now.
 */
export function useLiveBench(document: BenchDocument, queue: MarkQueue): void {
  const client = useQueryClient();
  const { user } = useMe();
  const clipId = document.clip.id;
  const answered = useRef(0);

  useSettled(queue, clipId, benchOptions(clipId).queryKey, (known, settled) => {
    const { repId, outcomes, touched, rep } = settled;
    if (!rep) return null;
    answered.current = performance.now();
    return withOutcomes(known, repId, outcomes, touched, rep);
  });

  useLiveEvents(
    useCallback(
      (event: LiveEvent) => {
        if (event.type !== 'marks' || event.clipId !== clipId) return;
        if (event.byUserId !== user.id) return;
        if (performance.now() - answered.current < OWN_ECHO_MS) return;
        void client.invalidateQueries({ queryKey: benchOptions(clipId).queryKey });
      },
      [client, clipId, user.id],
    ),
  );

  useEffect(() => {
    const disputed = queue.snapshot().marks.filter((each) => each.state.is === 'disputed');
    if (disputed.length === 0) return;
    const keys = new Map(disputed.map((each) => [keyOf(each), each]));
    for (const { rep, marks } of document.reps)
      for (const mark of marks) {
        if (!isLandmark(mark.landmark)) continue;
        const key = keyOf({
          repId: rep.id,
          frame: frameIndex(mark.frame),
          landmark: mark.landmark,
        });
        const own = keys.get(key);
        if (own?.state.is === 'disputed' && mark.revision > own.state.revision)
          void queue.theirsNow(key, mark);
      }
  }, [document, queue]);
}
