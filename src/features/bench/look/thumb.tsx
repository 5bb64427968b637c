import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useEffect, useRef } from 'react';
import type { Degrees } from '#shared/geometry/units.ts';
import { overlay } from '#shared/overlay/overlay.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import { landmark } from '#shared/landmarks/table.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import { liftText } from '#shared/overlay/figures.ts';
import { useBench, useBenchTools } from '../bench-context.ts';
import { hipsOf } from '../clip/overlay-of.ts';
import { cropAround } from './crop.ts';
import type { HollowFrame } from './followed.ts';
import type { ThumbPainter } from './thumb-painter.ts';

/** Px of the small picture; twice that many where the screen is fine. */
export const THUMB = { width: 132, height: 190 } as const;
const FINE = 2;
/** Around unsure marks nothing smaller than this is shown, source px: enough to know the place again. */
const LEAST_CROP = 260;

const pointsOf = ({ marks }: HollowFrame, ids: readonly (typeof LANDMARK_IDS)[number][]) =>
  ids.flatMap((id) => {
    const mark = marks[id];
    return mark?.to === 'point' ? [mark.point] : [];
  });

/** For those who do not see that one is ochre and the other grey. */
const doubtWords = (doubt = '', weightless = ''): string =>
  doubt !== ''
    ? `, unsure: ${doubt}`
    : weightless !== ''
      ? `, unsure but without weight: ${weightless}`
      : '';

/** One frame: the person with the marks, or what the tracker was not sure of; pressed, it is right. */
export function Thumb({
  own,
  painter,
  lift,
  chosen,
  onChoose,
  onPainted,
  onShow,
}: {
  own: HollowFrame;
  painter: ThumbPainter | null;
  /** Null: not known, or not to be shown. */
  lift: Degrees | null;
  chosen: boolean;
  onChoose: (chosen: boolean) => void;
  /** The picture is there, or cannot be made. */
  onPainted: (own: HollowFrame) => void;
  onShow: () => void;
}) {
  const { frameSize } = useBenchTools();
  const onScreen = useBench((state) => state.frame === own.frame);
  const canvas = useRef<HTMLCanvasElement>(null);
  const { frame, marks, rep, unsure, slight } = own;
  useEffect(() => {
    const target = canvas.current;
    if (!target || !painter) return;
    const close = unsure.length > 0;
    const viewport = cropAround(
      pointsOf(own, close ? unsure : LANDMARK_IDS),
      frameSize,
      { width: FINE * THUMB.width, height: FINE * THUMB.height },
      close ? LEAST_CROP : 0,
    );
    const drawn: Primitive[] = overlay({
      view: rep.rep.view,
      supportSide: rep.rep.supportSide,
      marks: engineMarks(marks, longEdgeOf(frameSize)),
      hips: hipsOf(marks, null),
      values: null,
    });
    const painted = () => onPainted(own);
    return painter.order({ frame, canvas: target, viewport, drawn, painted });
  }, [painter, own, frame, marks, rep, unsure, frameSize, onPainted]);
  const height = lift === null ? '' : `, lift ${liftText(lift, rep.rep.view === 'front', 0)}`;
  const [doubt, weightless] = [unsure, slight].map((ids) =>
    ids.map((id) => landmark(id).label.toLowerCase()).join('; '),
  );
  return (
    <li className="bench-thumb" data-current={onScreen || undefined}>
      <label className="relative block cursor-pointer">
        <input
          type="checkbox"
          checked={chosen}
          onChange={(event) => onChoose(event.target.checked)}
          aria-label={`Frame ${frame}${height}${doubtWords(doubt, weightless)}: right`}
          className="absolute left-1.5 top-1.5 size-6 accent-ink"
        />
        <canvas
          ref={canvas}
          width={FINE * THUMB.width}
          height={FINE * THUMB.height}
          className="block w-full bg-dusk"
        />
      </label>
      <button
        type="button"
        onClick={onShow}
        aria-label={`Show frame ${frame}`}
        className="flex min-h-[44px] w-full items-center justify-between gap-1 px-1.5 text-left text-caption"
      >
        <span className="font-bold underline underline-offset-[3px]">{frame}</span>
        <span className="text-soft">
          {lift === null ? '' : liftText(lift, rep.rep.view === 'front', 0)}
        </span>
      </button>
      {doubt && <p className="px-1.5 pb-1.5 text-caption leading-4 text-ochre">{doubt}</p>}
      {!doubt && weightless && (
        <p className="px-1.5 pb-1.5 text-caption leading-4 text-soft">{weightless}</p>
      )}
    </li>
  );
}
