import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { tallyOf } from '../model/led.ts';
import type { StripLayout } from './strip-layout.ts';

/** A notch per marked frame: solid, hollow while nobody has looked, short while it is not complete. */
export function StripNotches({
  reps,
  led,
  layout,
}: {
  reps: readonly BenchRep[];
  led: readonly LandmarkId[];
  layout: StripLayout;
}) {
  const { x, base, from, to } = layout;
  return (
    <g>
      {reps.flatMap(({ marks }) =>
        [...marks].map(([frame, there]) => {
          if (frame < from || frame > to) return null;
          const { tracked, toGo } = tallyOf(led, there);
          const tall = toGo > 0 ? 8 : 13;
          return (
            <rect
              key={frame}
              x={x(frame) - 2}
              y={base - tall}
              width="4"
              height={tall}
              className={tracked > 0 ? 'fill-mud stroke-ink' : 'fill-ink'}
            />
          );
        }),
      )}
    </g>
  );
}
