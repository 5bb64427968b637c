import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { LiveEvent } from '#shared/contracts/events.ts';
import { meQuery } from './accounts.queries.ts';
import { athletesKey } from './athletes.queries.ts';
import { benchOptions, clipOptions, commentsOptions } from './bench.queries.ts';
import { openLiveEvents } from './live-events.ts';
import { plansKey } from './plans.queries.ts';
import { sidesKey } from './readings.queries.ts';
import { reportsOptions } from './reports.queries.ts';
import { reviewQueueQuery } from './reviews.queries.ts';
import { todayQuery } from './today.queries.ts';
import { visitOptions } from './visits.queries.ts';

const heard = new Set<(event: LiveEvent) => void>();

/** Keeps the tab's stream open and asks again for what an event says has changed. Used once, by the frame. */
export function useLiveConnection(onSignedOut: () => void): void {
  const client = useQueryClient();
  useEffect(
    () =>
      openLiveEvents({
        onEvent: (event) => {
          if (event.type === 'signed-out') onSignedOut();
          else refresh(client, event);
          for (const listener of heard) listener(event);
        },
        onResume: () => void client.invalidateQueries(),
      }),
    [client, onSignedOut],
  );
}

/** Lets a page hear events itself. `listener` must keep its identity (`useCallback`). */
export function useLiveEvents(listener: (event: LiveEvent) => void): void {
  useEffect(() => {
    heard.add(listener);
    return () => void heard.delete(listener);
  }, [listener]);
}

/** What each event makes old. Own marks are not asked for again: the tab that placed them knows them. */
export function refresh(client: QueryClient, event: Exclude<LiveEvent, { type: 'signed-out' }>) {
  const invalidate = (queryKey: readonly unknown[], exact = false) =>
    void client.invalidateQueries({ queryKey, exact });
  const me = client.getQueryData(meQuery.queryKey);
  switch (event.type) {
    case 'clip':
      refreshClip(client, event);
      break;
    case 'marks':
      if (event.byUserId !== me?.user.id) invalidate(benchOptions(event.clipId).queryKey);
      break;
    case 'comments':
      invalidate(commentsOptions(event.clipId).queryKey);
      if (event.byUserId !== me?.user.id) invalidate(benchOptions(event.clipId).queryKey);
      invalidate(todayQuery.queryKey);
      invalidate(reviewQueueQuery.queryKey);
      break;
    case 'consent':
      // whatever is open of the athlete is asked for again, and refused where it is closed
      void client.invalidateQueries();
      break;
    case 'here':
      // for the Bench alone, which hears it itself
      break;
    case 'plan':
      invalidate(plansKey);
      invalidate(todayQuery.queryKey);
      break;
    case 'report':
      invalidate(reportsOptions(event.visitId).queryKey);
      break;
    case 'reading':
      invalidate(plansKey);
      invalidate(sidesKey(event.visitId));
      invalidate(todayQuery.queryKey);
      invalidate(reviewQueueQuery.queryKey);
      invalidate(athletesKey);
      break;
  }
}

/** Progress is shown from the event itself; only a change of state is worth a question. */
function refreshClip(client: QueryClient, event: Extract<LiveEvent, { type: 'clip' }>) {
  const { clipId, visitId, state, progress, secondsLeft } = event;
  const visitKey = visitOptions(visitId).queryKey;
  const known =
    client.getQueryData(visitKey)?.clips.find((clip) => clip.id === clipId)?.state ??
    (client
      .getQueryData(todayQuery.queryKey)
      ?.items.some((item) => item.kind === 'clip-preparing' && item.clipId === clipId)
      ? 'preparing'
      : undefined);
  if (known !== state) {
    void client.invalidateQueries({ queryKey: visitKey, exact: true });
    void client.invalidateQueries({ queryKey: clipOptions(clipId).queryKey });
    void client.invalidateQueries({ queryKey: benchOptions(clipId).queryKey });
    void client.invalidateQueries({ queryKey: todayQuery.queryKey });
    return;
  }
  client.setQueryData(
    visitKey,
    (page) =>
      page && {
        ...page,
        clips: page.clips.map((clip) =>
          clip.id === clipId ? { ...clip, progress, secondsLeft } : clip,
        ),
      },
  );
  client.setQueryData(
    todayQuery.queryKey,
    (page) =>
      page && {
        ...page,
        items: page.items.map((item) =>
          item.kind === 'clip-preparing' && item.clipId === clipId ? { ...item, progress } : item,
        ),
      },
  );
}
