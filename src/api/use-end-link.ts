import { useQueryClient } from '@tanstack/react-query';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { useStatus } from '#src/ui/status.tsx';
import { athletesKey } from './athletes.queries.ts';
import { call } from './client.ts';
import { replaysOptions } from './readings.queries.ts';

/** Ends a replay link at once, and asks again for every list that shows it. */
export function useEndLink(): (link: Replay) => Promise<void> {
  const client = useQueryClient();
  const say = useStatus();
  return async (link) => {
    await call(routes.revokeReplay, { params: { id: link.id } });
    await Promise.all([
      client.invalidateQueries({ queryKey: replaysOptions(link.visitId).queryKey }),
      client.invalidateQueries({ queryKey: athletesKey }),
    ]);
    say('The link is ended.');
  };
}
