import { useSyncExternalStore } from 'react';
import { framePoint } from '#shared/geometry/points.ts';
import { Magnifier } from '#src/canvas/magnifier.tsx';
import type { Moved } from '#src/canvas/konva-layer.tsx';
import type { Primitive } from '#shared/overlay/types.ts';
import { useBench, useBenchTools } from '../bench-context.ts';
import type { Target } from './use-target.ts';

const SIZE = 118;

/** The glass in the corner of a phone's clip; it moves over when the finger comes under it. */
export function CornerGlass({
  draw,
  target,
}: {
  draw: (moved: Moved) => readonly Primitive[];
  target: Target | null;
}) {
  const { hand, board, frameSize } = useBenchTools();
  const magnify = useBench((state) => state.taste.magnify);
  const { holding, aim, moved } = useSyncExternalStore(hand.subscribe, hand.get);
  if (!target && !moved) return null;
  const at = moved?.point ?? aim;
  const right = holding && at !== null && at.u < frameSize.width / 2 && at.v < frameSize.height / 2;
  return (
    <div
      className={`pointer-events-none absolute top-3 overflow-hidden rounded border border-dusk-ink leading-none ${right ? 'right-3' : 'left-3'}`}
    >
      <Magnifier
        board={board}
        frame={frameSize}
        width={SIZE}
        height={SIZE}
        enlarge={magnify}
        hand={hand}
        resting={target?.expected ?? framePoint(frameSize.width / 2, frameSize.height / 2)}
        draw={draw}
      />
    </div>
  );
}
