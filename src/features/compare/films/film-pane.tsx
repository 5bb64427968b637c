import { type CSSProperties, useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { LiftFrame } from '#shared/course/match-lifts.ts';
import { overlay } from '#shared/overlay/overlay.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { OverlayCanvas } from '#src/canvas/overlay-canvas.tsx';
import { longEdgeOf } from '#src/canvas/viewport.ts';
import { Button } from '#src/ui/button.tsx';
import { degrees, turn } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import type { Measured } from '../measured.ts';
import type { Film } from './use-film.ts';

/** One of the two films with its marks, and where it stands. */
export function FilmPane({
  name,
  measured,
  document,
  film,
  shown,
}: {
  name: string;
  measured: Measured;
  document: BenchDocument;
  film: Film;
  shown: LiftFrame;
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
    <figure className="rounded bg-dusk p-3 text-dusk-ink">
      <figcaption className="pb-2">{name}</figcaption>
      <div
        // on a phone both films and the slider fit one screen
        className="relative mx-auto max-w-[calc(30dvh*var(--shape))] overflow-hidden bg-[#000] tablet:max-w-[calc(58dvh*var(--shape))]"
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
      <p className="mt-2 flex flex-wrap justify-between gap-x-4 tabular-nums">
        <span>
          Lift {degrees(shown.lift)}
          {turned !== null && `, turn ${turn(turned)}`}
          {!here && <span className="text-dusk-soft">, between two marked frames</span>}
        </span>
        <Link
          to={paths.bench(clip.id, { frame: shown.frame })}
          className="text-dusk-ink"
          aria-label={`Open frame ${shown.frame} on the Bench: ${name}`}
        >
          Frame {shown.frame} on the Bench
        </Link>
      </p>
    </figure>
  );
}
