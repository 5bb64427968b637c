import { useMemo } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { liftWay, matchLifts } from '#shared/course/match-lifts.ts';
import { timesOf } from '#shared/records/engine-input.ts';
import { Button } from '#src/ui/button.tsx';
import { cx } from '#src/ui/class-names.ts';
import { scheduleOf } from '#src/canvas/matched/schedule.ts';
import { useMoments } from '#src/canvas/matched/use-moments.ts';
import { degrees } from '#src/ui/figures.ts';
import { Empty } from '#src/ui/states.tsx';
import { type Measured, nameOf } from '../measured.ts';
import { FilmPane } from './film-pane.tsx';
import { MomentSlider } from './moment-slider.tsx';
import { useClipFilm } from './use-clip-film.ts';

const timesOfClip = ({ clip }: BenchDocument) => (clip.frames ? timesOf(clip.frames) : []);

/** Two such clips have room beside each other on a phone; wide ones would become too small to see anything. */
const isUpright = ({ clip: { width, height } }: BenchDocument): boolean =>
  width !== null && height !== null && width < height;

/** Two panes, one slider: every place of it is a moment at which both lifts are the same. */
export function Films({
  pair,
  documents,
}: {
  pair: readonly [Measured, Measured];
  documents: readonly [BenchDocument, BenchDocument];
}) {
  const [one, other] = pair;
  const moments = useMemo(
    () => matchLifts(liftWay(one.rep.result.frames), liftWay(other.rep.result.frames)),
    [one, other],
  );
  const schedule = useMemo(
    () => scheduleOf(moments, timesOfClip(documents[0]), timesOfClip(documents[1])),
    [moments, documents],
  );
  const films = [useClipFilm(documents[0].clip), useClipFilm(documents[1].clip)] as const;
  const { at, playing, goTo, toggle, failed } = useMoments(moments, schedule, films);
  const now = moments[at];
  if (!now)
    return (
      <Empty title="The two share no lift">
        One rep’s lift ends before the other’s begins, so no moment of them is the same.
      </Empty>
    );
  const beside = documents.every(isUpright);
  const highest = moments.reduce((most, { first }) => Math.max(most, first.lift), 0);
  return (
    <div
      onKeyDown={(event) => {
        const typed = event.target instanceof HTMLElement && event.target.closest('button');
        if (event.key !== ' ' || typed) return;
        event.preventDefault();
        toggle();
      }}
    >
      <div
        className={cx(
          'grid gap-x-2 gap-y-2 tablet:grid-cols-2 tablet:gap-x-4',
          beside && 'grid-cols-2',
        )}
      >
        {([0, 1] as const).map((n) => (
          <FilmPane
            key={n}
            name={`${n === 0 ? 'First' : 'Second'}: ${nameOf(pair[n])}`}
            measured={pair[n]}
            document={documents[n]}
            film={films[n]}
            shown={n === 0 ? now.first : now.second}
            beside={beside}
          />
        ))}
      </div>
      <MomentSlider moments={moments} at={at} onGo={goTo} />
      <div className="mt-3 flex flex-wrap items-center gap-x-6 gap-y-2">
        <Button look="primary" onClick={toggle} disabled={!films[0].ready || !films[1].ready}>
          {playing ? 'Stop' : 'Play both slowly'}
        </Button>
        <p className="text-note text-soft">
          Arrows one step, Page Up and Page Down ten, Home and End the bounds, the space bar plays.
          Only lifts that both reach are shown, here up to {degrees(highest, 0)}.
        </p>
      </div>
      {failed && (
        <p role="alert" className="mt-2 text-alarm">
          Playing stopped: a picture could not be read. Step on by hand, or reload the page.
        </p>
      )}
    </div>
  );
}
