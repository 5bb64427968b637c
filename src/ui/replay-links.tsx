import type { ReactNode } from 'react';
import type { Replay } from '#shared/contracts/replays.ts';
import { ConfirmButton } from './confirm.tsx';
import { moment } from './days.ts';
import { howOften } from './figures.ts';
import { type FilmActs, LinkFilm } from './link-film.tsx';
import { LinkHead } from './link-head.tsx';
import { StateDot, type StateKind } from './state-dot.tsx';

const STATES: Record<Replay['state'], readonly [kind: StateKind, words: string]> = {
  live: ['done', 'open'],
  lapsed: ['none', 'lapsed'],
  revoked: ['bad', 'ended'],
};

const openings = ({ openings: count, lastOpenedAt }: Replay): string => {
  if (count === 0 || lastOpenedAt === null) return 'not opened yet';
  return `opened ${howOften(count)}, last ${moment(lastOpenedAt)}`;
};

/** Replay links: whether each still opens, whether it was opened, and the way to end it. */
export function ReplayLinks({
  links,
  nameOf,
  onEnd,
  onHideAgain,
  film,
}: {
  links: readonly Replay[];
  /** What a link plays, said before how often it was opened. */
  nameOf: (link: Replay) => ReactNode;
  /** Left out where this person may not end them. */
  onEnd?: (link: Replay) => Promise<void>;
  /** Left out where this person may not make links. */
  onHideAgain?: (link: Replay) => Promise<void>;
  /** What can be done about the film to keep. */
  film: FilmActs;
}) {
  return (
    <ul>
      {links.map((link) => {
        const [kind, words] = STATES[link.state];
        return (
          <li
            key={link.id}
            className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-2.5 last:border-0"
          >
            <div>
              <StateDot kind={kind}>{words}</StateDot>{' '}
              <span>
                {nameOf(link)}
                {openings(link)}
              </span>
              <p className="text-note text-soft">
                Made {moment(link.at)} by {link.by.name}
                {link.passPhrase && ', with a pass phrase'};{' '}
                {link.state === 'live' ? 'ends' : 'until'} {moment(link.expiresAt)}.
              </p>
              {link.state === 'live' && link.head !== 'shown' && (
                <LinkHead head={link.head} onAgain={onHideAgain && (() => onHideAgain(link))} />
              )}
              {link.state === 'live' && link.before && (
                <LinkHead
                  head={link.before.head}
                  besideOf={link.before.visitDay}
                  onAgain={onHideAgain && (() => onHideAgain(link))}
                />
              )}
              {link.state === 'live' && <LinkFilm link={link} {...film} />}
            </div>
            {link.state === 'live' && onEnd && (
              <ConfirmButton
                look="plain"
                className="!text-alarm"
                label="End it"
                title="End this link?"
                confirm="End the link"
                onConfirm={() => onEnd(link)}
              >
                <p>
                  From this moment it opens nothing, for whoever has it. It cannot be opened again;
                  another link can be made.
                </p>
              </ConfirmButton>
            )}
          </li>
        );
      })}
    </ul>
  );
}
