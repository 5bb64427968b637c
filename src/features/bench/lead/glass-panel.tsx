import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useRef } from 'react';
import { framePoint } from '#shared/geometry/points.ts';
import { Magnifier } from '#src/canvas/magnifier.tsx';
import { useSize } from '#src/canvas/use-size.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { marksOn } from '../model/bench-model.ts';
import { useDraw } from '../clip/use-draw.ts';
import type { Target } from '../clip/use-target.ts';
import { MAGNIFICATIONS } from '../store/taste.ts';
import { typicalErrorPx } from './lead-words.ts';

/** The magnifier of the lead column, with how strongly it magnifies and how certain a hand is. */
export function GlassPanel({ target }: { target: Target | null }) {
  const { hand, board, frameSize, copySize, store } = useBenchTools();
  const magnify = useBench((state) => state.taste.magnify);
  const draw = useDraw();
  const { current, led } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const marks = marksOn(current, frame);
  // with nothing asked for it rests on the first mark there is
  const first = led.map((id) => marks[id]).find((mark) => mark?.to === 'point');
  const resting = target?.expected ?? (first?.to === 'point' ? first.point : null);
  const box = useRef<HTMLDivElement>(null);
  const size = useSize(box);
  const stronger = () => {
    const next = MAGNIFICATIONS[(MAGNIFICATIONS.findIndex((each) => each === magnify) + 1) % 4];
    store.setState((state) => ({ taste: { ...state.taste, magnify: next ?? magnify } }));
  };
  const coarser = longEdgeOf(frameSize) / longEdgeOf(copySize);
  if (!target && !resting) return null;
  return (
    <div className="bench-glass">
      <div ref={box} className="bench-glass-box">
        {size && (
          <Magnifier
            board={board}
            frame={frameSize}
            width={size.width}
            height={size.height}
            enlarge={magnify}
            hand={hand}
            // nowhere yet: the middle of the picture, where the keyboard’s cross stands
            resting={resting ?? framePoint(frameSize.width / 2, frameSize.height / 2)}
            draw={draw}
            className="block rounded-[2px]"
          />
        )}
      </div>
      <p className="flex items-baseline justify-between gap-2 text-caption text-dusk-soft">
        <button
          type="button"
          onClick={stronger}
          className="min-h-[44px] text-left underline underline-offset-[3px]"
          aria-label={`Magnifier: ${magnify} times the phone’s pixels. Change.`}
        >
          {magnify} × the phone’s pixels
        </button>
        {target?.landmark && (
          <span title="typical random error of one such mark">
            ± {typicalErrorPx(target.landmark, coarser)} px
          </span>
        )}
      </p>
    </div>
  );
}
