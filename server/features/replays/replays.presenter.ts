import type { Replay as ReplayShape } from '#shared/contracts/replays.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { presentFilm } from './film/film-state.ts';
import type { KeptFilm } from './film/kept-film.entity.ts';
import type { Replay } from './replay.entity.ts';

const stateOf = ({ revokedAt, expiresAt }: Replay): ReplayShape['state'] => {
  if (revokedAt) return 'revoked';
  return expiresAt.getTime() <= Date.now() ? 'lapsed' : 'live';
};

/**
 * @param replay with `by` and the lazy `passPhraseHash` loaded; the hash itself never leaves
 * @param head how its head stands
 * @param before the earlier lift beside it
 * @param film its film to keep, where one was asked for
 */
export const presentReplay = (
  replay: Replay,
  { head, before, film }: Pick<ReplayShape, 'head' | 'before'> & { readonly film: KeptFilm | null },
): ReplayShape => ({
  id: replay.id,
  visitId: replay.visit.id,
  side: replay.side,
  repId: replay.rep.id,
  fromFrame: replay.fromFrame,
  toFrame: replay.toFrame,
  showReading: replay.showReading,
  showCall: replay.showCall,
  head,
  before,
  film: film && presentFilm(film, replay, head),
  message: replay.message,
  passPhrase: Boolean(replay.passPhraseHash?.unwrap()),
  state: stateOf(replay),
  openings: replay.openings,
  lastOpenedAt: replay.lastOpenedAt?.toISOString() ?? null,
  expiresAt: replay.expiresAt.toISOString(),
  by: presentPerson(replay.by.unwrap()),
  at: replay.at.toISOString(),
});
