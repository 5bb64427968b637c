import { liftReadout, turnReadout } from '#shared/replay/readout.ts';
import type { Shown } from '#shared/replay/drawn-on.ts';
import type { Film } from '#src/canvas/matched/use-film.ts';
import { OverlayCanvas } from '#src/canvas/overlay-canvas.tsx';
import { Button } from '#src/ui/button.tsx';
import type { Crop } from '../player/crop.ts';

/** One of the two films, with its marks and what they say. */
export function Pane({
  name,
  label,
  film,
  size,
  crop,
  shown,
  fromFront,
  figures,
}: {
  name: string;
  label: string;
  film: Film;
  /** Of the source frame, px. */
  size: { readonly width: number; readonly height: number };
  crop: Crop;
  shown: Shown;
  fromFront: boolean;
  figures: boolean;
}) {
  const { attach, ready, error, retry } = film;
  const lift = liftReadout(shown, fromFront);
  const turn = turnReadout(shown);
  return (
    <figure className="min-w-0">
      <figcaption className="px-2 py-2 font-bold">{name}</figcaption>
      <div
        className="relative w-full overflow-hidden bg-[#000]"
        style={{ aspectRatio: `${crop.width} / ${crop.height}` }}
      >
        <canvas
          ref={attach}
          role="img"
          aria-label={label}
          className="absolute max-w-none"
          style={{
            width: `${(100 * size.width) / crop.width}%`,
            height: `${(100 * size.height) / crop.height}%`,
            left: `${(-100 * crop.u) / crop.width}%`,
            top: `${(-100 * crop.v) / crop.height}%`,
          }}
        />
        {ready && <OverlayCanvas primitives={shown.primitives} part={crop} />}
        {error ? (
          <div role="alert" className="absolute inset-x-2 top-1/3 rounded bg-mud p-3 text-ink">
            <p className="mb-2 text-note">This film could not be loaded.</p>
            <Button onClick={retry}>Try again</Button>
          </div>
        ) : (
          !ready && (
            <p role="status" className="absolute inset-x-0 top-1/2 text-center text-note">
              Loading the film…
            </p>
          )
        )}
      </div>
      {figures && (
        <dl className="px-2 py-2 text-note leading-6 text-dusk-soft">
          <div>
            <dt className="inline">lifted thigh </dt>
            <dd className="inline whitespace-nowrap font-bold text-tide-dusk">
              {lift === '' ? '–' : lift}
            </dd>
          </div>
          <div>
            <dt className="inline">standing hip </dt>
            <dd className="inline whitespace-nowrap font-bold text-shank-dusk">
              {turn === '' ? '–' : turn}
            </dd>
          </div>
        </dl>
      )}
    </figure>
  );
}
