import { QueryClient } from '@tanstack/react-query';
import { describe, expect, it } from 'vitest';
import type { Clip } from '#shared/contracts/clips.ts';
import { meQuery } from './accounts.queries.ts';
import { benchOptions } from './bench.queries.ts';
import { sideReadingOptions } from './readings.queries.ts';
import { todayQuery } from './today.queries.ts';
import { refresh } from './use-live.ts';
import { visitOptions } from './visits.queries.ts';
import { aClip, aMe, aVisit, clipId, noSteps, otherId, visitId } from '#tests/support/records.ts';

function clientWith(clip: Partial<Clip>) {
  const client = new QueryClient();
  client.setQueryData(meQuery.queryKey, aMe());
  client.setQueryData(visitOptions(visitId).queryKey, {
    visit: aVisit(),
    clips: [aClip(clip)],
  });
  client.setQueryData(todayQuery.queryKey, {
    items: [],
    athletes: 1,
    visitsThisWeek: 1,
    steps: noSteps,
  });
  return client;
}
/** Something was asked for before; what does not matter here. */
const known = (client: QueryClient, queryKey: readonly unknown[]) =>
  client.getQueryCache().build(client, { queryKey }).setData('known');
const isOld = (client: QueryClient, queryKey: readonly unknown[]) =>
  client.getQueryState(queryKey)?.isInvalidated;
const clipEvent = (state: Clip['state'], progress: number | null) => ({
  type: 'clip' as const,
  clipId,
  visitId,
  state,
  progress,
  secondsLeft: null,
});

describe('refresh', () => {
  it('shows progress without asking again', () => {
    const client = clientWith({ state: 'preparing', progress: 10 });
    refresh(client, clipEvent('preparing', 60));
    expect(client.getQueryData(visitOptions(visitId).queryKey)?.clips[0]?.progress).toBe(60);
    expect(isOld(client, visitOptions(visitId).queryKey)).toBe(false);
  });

  it('asks again when a clip changes its state', () => {
    const client = clientWith({ state: 'preparing', progress: 99 });
    refresh(client, clipEvent('ready', null));
    expect(isOld(client, visitOptions(visitId).queryKey)).toBe(true);
    expect(isOld(client, todayQuery.queryKey)).toBe(true);
  });

  it('takes the marks of another person for news, one’s own not', () => {
    const client = clientWith({});
    known(client, benchOptions(clipId).queryKey);
    const marks = (byUserId: string) => ({
      type: 'marks' as const,
      clipId,
      repId: clipId,
      byUserId,
    });
    refresh(client, marks(aMe().user.id));
    expect(isOld(client, benchOptions(clipId).queryKey)).toBe(false);
    refresh(client, marks(otherId));
    expect(isOld(client, benchOptions(clipId).queryKey)).toBe(true);
  });

  it('makes both sides’ readings old after one side changed, for they are compared', () => {
    const client = clientWith({});
    const { queryKey } = sideReadingOptions(visitId, 'left');
    known(client, queryKey);
    refresh(client, { type: 'reading', visitId, side: 'right' });
    expect(isOld(client, queryKey)).toBe(true);
  });
});
