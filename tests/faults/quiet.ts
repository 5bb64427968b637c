import { setTimeout as pause } from 'node:timers/promises';
import { asAdmin } from '#tests/support/admin.ts';
import type { Place } from './place.ts';

const TRIES = 1200;

/** What is still to be done by itself; waits in the queue for another day are none of it. */
const OPEN = `
  select 'clip ' || state as what from clip where state in ('waiting', 'preparing')
  union all select 'reading' from side_setting where stale
  union all select 'report' from report where state = 'asked'
  union all select 'film' from kept_film where state = 'asked'
  union all select 'erasure' from erasure where done_at is null
  union all select 'outbox ' || queue from job_outbox where sent_at is null
  union all select 'job ' || name || ' ' || state::text from pgboss.job
    where state in ('created', 'retry', 'active') and start_after < now() + interval '10 minutes'`;

const openNow = ({ instance }: Place): Promise<string[]> =>
  asAdmin(
    async (client) => (await client.query<{ what: string }>(OPEN)).rows.map(({ what }) => what),
    new URL(instance.urls.appUrl).pathname.slice(1),
  );

/** Waits until everything was done that is done by itself. */
export const quiet = async (place: Place): Promise<void> => {
  let open: string[] = [];
  for (let tries = 0; tries < TRIES; tries++) {
    open = await openNow(place);
    if (open.length === 0) return;
    await pause(100);
  }
  throw new Error(`Not taken up again by itself: ${open.join(', ')}`);
};
