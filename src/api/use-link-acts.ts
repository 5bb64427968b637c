import { useQueryClient } from '@tanstack/react-query';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { saveAs } from '#src/ui/save-as.ts';
import { useStatus } from '#src/ui/status.tsx';
import { athletesKey } from './athletes.queries.ts';
import { call, download } from './client.ts';
import { replaysOptions } from './readings.queries.ts';

/** What can be done to a link that was made; every list that shows it is asked for again. */
export function useLinkActs(): Record<
  'end' | 'hideAgain' | 'makeFilm' | 'saveFilm',
  (link: Replay) => Promise<void>
> {
  const client = useQueryClient();
  const say = useStatus();
  const listsAgain = ({ visitId }: Replay) =>
    Promise.all([
      client.invalidateQueries({ queryKey: replaysOptions(visitId).queryKey }),
      client.invalidateQueries({ queryKey: athletesKey }),
    ]);
  return {
    end: async (link) => {
      await call(routes.revokeReplay, { params: { id: link.id } });
      await listsAgain(link);
      say('The link is ended.');
    },
    hideAgain: async (link) => {
      await call(routes.hideHeadAgain, { params: { id: link.id } });
      await listsAgain(link);
    },
    makeFilm: async (link) => {
      await call(routes.makeFilm, { params: { id: link.id } });
      await listsAgain(link);
    },
    saveFilm: async ({ id }) => {
      const { name, blob } = await download(routes.keptFilm, { params: { id } });
      saveAs(name, blob);
    },
  };
}
