import { type CSSProperties, useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { LiftFrame } from '#shared/course/match-lifts.ts';
import { overlay } from '#shared/overlay/overlay.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { OverlayCanvas } from '#src/canvas/overlay-canvas.tsx';
import type { Film } from '#src/canvas/matched/use-film.ts';
import { longEdgeOf } from '#src/canvas/viewport.ts';
import { Button } from '#src/ui/button.tsx';
import { cx } from '#src/ui/class-names.ts';
import { degrees, turn } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import type { Measured } from '../measured.ts';

/** One of the two films with its marks, and where it stands. */
export function FilmPane({
  name,
  measured,
  document,
  film,
  shown,
  beside,
}: {
  name: string;
  measured: Measured;
  document: BenchDocument;
  film: Film;
  shown: LiftFrame;
  /** Both stand beside each other on a phone too. */
  beside: boolean;
}) {
  const { rep } = measured;
  const { attach, ready, error, retry } = film;
  const { clip, reps } = document;
  const size = useMemo(
    () => ({ u: 0, v: 0, width: clip.width ?? 9, height: clip.height ?? 16 }),
    [clip.width, clip.height],
  );
  const stored = reps.find((each) => each.rep.id === rep.id);
  const marks = useMemo(() => marksWith(stored?.marks ?? [], []), [stored]);
  const here = marks.get(shown.frame);
  const primitives = useMemo(
    () =>
      here && stored
        ? overlay({
            view: stored.rep.view,
            supportSide: stored.rep.supportSide,
            marks: engineMarks(here, longEdgeOf(size)),
            hips: { support: null, lifted: null },
            values: null,
          })
        : [],
    [here, stored, size],
  );
  const shape = size.width / size.height;
  const turned = turnAt(rep.result.curve, shown.lift);
  return (
    // names, pictures and figures of the two stand in three rows, however long the names are
    <figure className="row-span-3 grid min-w-0 grid-rows-subgrid rounded bg-dusk p-2 text-note text-dusk-ink tablet:p-3 tablet:text-body">
      <figcaption>{name}</figcaption>
      <div
        // on a phone both films and the slider fit one screen
        className={cx(
          'relative mx-auto w-full self-start overflow-hidden bg-[#000] tablet:max-w-[calc(58dvh*var(--shape))]',
          beside ? 'max-w-[calc(45dvh*var(--shape))]' : 'max-w-[calc(30dvh*var(--shape))]',
        )}
        style={{ aspectRatio: shape, '--shape': shape } as CSSProperties}
      >
        <canvas
          ref={attach}
          role="img"
          aria-label={`${name}, frame ${shown.frame}`}
          className="absolute inset-0 h-full w-full"
        />
        <OverlayCanvas primitives={primitives} part={size} />
        {error ? (
          <div role="alert" className="absolute inset-x-3 top-1/3 rounded bg-mud p-4 text-ink">
            <p className="mb-3">{error.message}</p>
            <Button onClick={retry}>Try again</Button>
          </div>
        ) : (
          !ready && (
            <p role="status" className="absolute inset-x-0 top-1/2 text-center text-note">
              Loading the clip
            </p>
          )
        )}
      </div>
      {/* the same lines at every moment, so that nothing moves under the thumb on the slider */}
      <div className="grid content-start justify-items-start gap-x-4 tabular-nums tablet:grid-cols-[1fr_auto]">
        <p className="min-h-[2lh] tablet:min-h-0">
          Lift {degrees(shown.lift)}
          {turned !== null && (
            <>
              , <span className="inline-block">turn {turn(turned)}</span>
            </>
          )}
        </p>
        <p className="text-caption text-dusk-soft tablet:col-start-1 tablet:text-body">
          {here ? 'on a marked frame' : 'between two marks'}
        </p>
        <Link
          to={paths.bench(clip.id, { frame: shown.frame })}
          className="tap text-dusk-ink tablet:col-start-2 tablet:row-start-1"
          aria-label={`Open frame ${shown.frame} on the Bench: ${name}`}
        >
          Frame {shown.frame} on the Bench
        </Link>
      </div>
    </figure>
  );
}
