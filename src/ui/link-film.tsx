import { useRef, useState } from 'react';
import type { KeptFilm } from '#shared/contracts/kept-film.ts';
import type { Replay } from '#shared/contracts/replays.ts';
import { Button } from './button.tsx';
import { moment } from './days.ts';
import { fileSize, howOften } from './figures.ts';
import { ErrorState } from './states.tsx';
import { StateDot, type StateKind } from './state-dot.tsx';

const KINDS: Record<KeptFilm['state'], StateKind> = {
  asked: 'wait',
  'head-first': 'wait',
  ready: 'done',
  failed: 'bad',
};

const takenWords = ({ taken, lastTakenAt }: KeptFilm): string => {
  if (taken === 0 || lastTakenAt === null) return 'not taken yet';
  return `taken ${howOften(taken)}, last ${moment(lastTakenAt)}`;
};

const filmWords = (film: KeptFilm): string => {
  switch (film.state) {
    case 'asked':
      return 'The film to keep is being made.';
    case 'head-first':
      return 'The film to keep is made once the film with the hidden head is there.';
    case 'failed':
      return 'The film to keep could not be made. Try again; if it fails once more, look whether the clip still plays on the Bench.';
    case 'ready':
      return `The athlete can keep the film, ${fileSize(film.bytes ?? 0)}: ${takenWords(film)}.${film.madeAt ? ` It says what stood ${moment(film.madeAt)}.` : ''}`;
  }
};

export interface FilmActs {
  readonly onSave: (link: Replay) => Promise<void>;
  /** Left out where this person may not ask for it. */
  readonly onMake?: (link: Replay) => Promise<void>;
}

/** The film of a link with drawing and words in its picture: whether there is one, and the way to it. */
export function LinkFilm({ link, onSave, onMake }: { link: Replay } & FilmActs) {
  const [busy, setBusy] = useState<'make' | 'save' | null>(null);
  const [error, setError] = useState<unknown>(null);
  const words = useRef<HTMLParagraphElement>(null);
  const { film } = link;
  const act = async (which: 'make' | 'save', ask: () => Promise<void>) => {
    setBusy(which);
    setError(null);
    try {
      await ask();
      // the button goes, the keyboard stays in this row
      if (which === 'make') words.current?.focus();
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(null);
    }
  };
  if (!film && !onMake) return null;
  const label =
    film?.state === 'failed'
      ? 'Try again'
      : film?.state === 'ready'
        ? 'Make it anew'
        : 'Make a film to keep';
  return (
    <>
      <p ref={words} tabIndex={-1} className="max-w-lead text-note">
        {film ? (
          <StateDot kind={KINDS[film.state]} wrap>
            {filmWords(film)}
          </StateDot>
        ) : (
          <span className="text-soft">
            A film to keep has the marks and what the replay says in its picture; whoever has the
            link can take it home.
          </span>
        )}
      </p>
      {error !== null && <ErrorState error={error} />}
      <div className="flex flex-wrap gap-x-4">
        {film?.state === 'ready' && (
          <Button
            look="plain"
            busy={busy === 'save'}
            onClick={() => void act('save', () => onSave(link))}
          >
            Save the film
          </Button>
        )}
        {onMake && film?.state !== 'asked' && film?.state !== 'head-first' && (
          <Button
            look="plain"
            busy={busy === 'make'}
            onClick={() => void act('make', () => onMake(link))}
          >
            {label}
          </Button>
        )}
      </div>
    </>
  );
}
