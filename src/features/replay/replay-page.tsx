import { lazy, Suspense, useEffect, useMemo, useRef, useState } from 'react';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { cx } from '#src/ui/class-names.ts';
import { longDay, shortDay } from '#src/ui/days.ts';
import { frameTimes } from '#src/video/frame-times.ts';
import { WhichFilm } from './beside/which-film.tsx';
import { Contact } from './contact.tsx';
import { Comments } from './comments.tsx';
import { KeepFilm } from './keep-film.tsx';
import { NoFilmYet } from './no-film-yet.tsx';
import { Player } from './player/player.tsx';
import { useLoop } from './player/use-loop.ts';
import { Result } from './result.tsx';
import { useStillLive } from './use-still-live.ts';

/** Drawings and all: fetched only where there is a plan. */
const AthletePlan = lazy(() =>
  import('./plan/athlete-plan.tsx').then((part) => ({ default: part.AthletePlan })),
);

/** Exact frames of two films: fetched only where the athlete asks for them. */
const Beside = lazy(() => import('./beside/beside.tsx'));

/** One replay, as the athlete sees it: the film first, then what it says, in plain words. */
export function ReplayPage({
  token,
  replay,
  onEnded,
  onReady,
}: {
  token: string;
  replay: PublicReplay;
  /** The link opens nothing any more. */
  onEnded: () => void;
  /** Something that it shows is another by now: a film is ready, a plan was stopped. */
  onReady: () => void;
}) {
  const times = useMemo(() => frameTimes(replay.frames), [replay.frames]);
  const loop = useLoop(replay, times);
  const { ended, check } = useStillLive(token, replay.expiresAt);
  useEffect(() => {
    if (ended) onEnded();
  }, [ended, onEnded]);
  const film = useRef<HTMLDivElement>(null);
  const [comment, setComment] = useState<PublicReplay['comments'][number] | null>(null);
  const { before } = replay;
  const [beside, setBeside] = useState(false);
  const choose = (both: boolean) => {
    if (both) loop.pause();
    setBeside(both);
  };
  const showComment = (each: PublicReplay['comments'][number]) => {
    setBeside(false);
    setComment(each);
    loop.show(each.fromFrame);
    film.current?.scrollIntoView({ block: 'start' });
  };
  const { practice, athleteGivenName, visitDay, coachName, message, expiresAt } = replay;
  return (
    <>
      <title>{`Your replay, ${athleteGivenName} · Redshank`}</title>
      <header className="flex flex-wrap justify-between gap-x-4 bg-dusk px-4 py-3 text-dusk-ink print:bg-transparent print:text-ink">
        <b>Your replay, {athleteGivenName}</b>
        <span className="text-dusk-soft print:text-soft">
          {practice.name}, {shortDay(visitDay)}
        </span>
      </header>
      <main
        className={cx(
          'tablet:mx-auto tablet:grid tablet:max-w-[1120px] tablet:items-start tablet:gap-x-12 tablet:px-8 tablet:pt-8',
          beside
            ? 'tablet:grid-cols-[minmax(0,620px)_minmax(0,1fr)]'
            : 'tablet:grid-cols-[minmax(0,460px)_minmax(0,1fr)]',
        )}
      >
        <div ref={film} className="tablet:sticky tablet:top-4">
          {replay.head === 'being-prepared' || replay.head === 'failed' ? (
            <NoFilmYet token={token} head={replay.head} coach={coachName} onReady={onReady} />
          ) : (
            <>
              {before && <WhichFilm before={before} beside={beside} onChoose={choose} />}
              <div className={beside ? 'hidden print:block' : undefined}>
                <Player
                  token={token}
                  replay={replay}
                  times={times}
                  loop={loop}
                  comment={comment}
                  onFailed={check}
                />
              </div>
              {before && beside && (
                <Suspense
                  fallback={
                    <p role="status" className="bg-dusk px-4 py-6 text-dusk-soft">
                      Loading both films…
                    </p>
                  }
                >
                  <Beside token={token} replay={replay} before={before} times={times} />
                </Suspense>
              )}
            </>
          )}
        </div>
        <div className="px-4 text-sub leading-7 tablet:px-0 print:text-note print:leading-[22px]">
          <Result replay={replay} />
          <StopIfItHurts contact={practice.contact} coach={coachName} />
          {message !== '' && (
            <section aria-label={`From ${coachName}`} className="border-t border-rule py-6">
              <h2 className="text-lead font-bold">From {coachName}</h2>
              <p className="mt-1 whitespace-pre-line">“{message}”</p>
            </section>
          )}
          {replay.plan && (
            <Suspense
              fallback={
                <p role="status" className="border-t border-rule py-6 text-soft">
                  Loading your plan…
                </p>
              }
            >
              <AthletePlan
                token={token}
                given={replay.plan}
                coach={coachName}
                contact={practice.contact}
                onEnded={onEnded}
                onChanged={onReady}
              />
            </Suspense>
          )}
          {replay.film && <KeepFilm token={token} film={replay.film} practice={practice.name} />}
          <Comments comments={replay.comments} shown={comment} onShow={showComment} />
          <footer className="border-t border-rule py-6 text-note text-soft">
            <p>
              Whoever has this link can open it until {longDay(expiresAt.slice(0, 10))}. It shows
              this replay and nothing else.{' '}
              {replay.head !== 'shown' &&
                'The head is hidden on the film; clothes, room, tattoos and the way of moving can still tell who it is. '}{' '}
              To have it ended earlier or your film deleted, ask {practice.name}.
            </p>
          </footer>
        </div>
      </main>
    </>
  );
}

function StopIfItHurts({ contact, coach }: { contact: string; coach: string }) {
  return (
    <aside className="mb-6 border-l-[3px] border-ochre py-1 pl-4">
      <b className="text-ochre">Stop if it hurts.</b> Pain, pinching or dizziness: stop, and call{' '}
      {coach} before you go on.
      <Contact contact={contact} className="block" />
    </aside>
  );
}
