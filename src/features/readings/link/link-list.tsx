import { useQueryClient } from '@tanstack/react-query';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { replaysOptions } from '#src/api/readings.queries.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { moment } from '#src/ui/days.ts';
import { inWords } from '#src/ui/figures.ts';
import { StateDot, type StateKind } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import type { NamedRep } from '../side-clips.ts';

const STATES: Record<Replay['state'], readonly [kind: StateKind, words: string]> = {
  live: ['done', 'open'],
  lapsed: ['none', 'lapsed'],
  revoked: ['bad', 'ended'],
};

const openings = ({ openings: count, lastOpenedAt }: Replay): string => {
  if (count === 0 || lastOpenedAt === null) return 'not opened yet';
  const times = count === 1 ? 'once' : count === 2 ? 'twice' : `${inWords(count)} times`;
  return `opened ${times}, last ${moment(lastOpenedAt)}`;
};

/** Every link that was made for this side, whether it still opens, and whether it was opened. */
export function LinkList({ links, reps }: { links: readonly Replay[]; reps: readonly NamedRep[] }) {
  const client = useQueryClient();
  const say = useStatus();
  if (links.length === 0) return null;
  const end = async (link: Replay) => {
    await call(routes.revokeReplay, { params: { id: link.id } });
    await client.invalidateQueries({ queryKey: replaysOptions(link.visitId).queryKey });
    say('The link is ended.');
  };
  return (
    <div className="mt-8">
      <h3 className="font-bold">Links that were made</h3>
      <ul>
        {links.map((link) => {
          const [kind, words] = STATES[link.state];
          const rep = reps.find((named) => named.rep.id === link.repId)?.rep;
          return (
            <li
              key={link.id}
              className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-2.5 last:border-0"
            >
              <div>
                <StateDot kind={kind}>{words}</StateDot>{' '}
                <span>
                  {rep ? `rep ${rep.number}, ` : ''}
                  {openings(link)}
                </span>
                <p className="text-note text-soft">
                  Made {moment(link.at)} by {link.by.name}
                  {link.passPhrase && ', with a pass phrase'};{' '}
                  {link.state === 'live' ? 'ends' : 'until'} {moment(link.expiresAt)}.
                </p>
              </div>
              {link.state === 'live' && (
                <ConfirmButton
                  look="plain"
                  className="!text-alarm"
                  label="End it"
                  title="End this link?"
                  confirm="End the link"
                  onConfirm={() => end(link)}
                >
                  <p>
                    From this moment it opens nothing, for whoever has it. It cannot be opened
                    again; another link can be made.
                  </p>
                </ConfirmButton>
              )}
            </li>
          );
        })}
      </ul>
    </div>
  );
}
