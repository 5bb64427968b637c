import { type KeyboardEvent, type PointerEvent, useContext, useState } from 'react';
import { type Box, boxWithin } from '#shared/geometry/boxes.ts';
import { LEAST_HEAD_PX } from '#shared/head/head-track.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { clamp } from '#shared/geometry/units.ts';
import { type Size, toStage, type Viewport } from '#src/canvas/viewport.ts';
import { useBench, useBenchTools } from '../bench-context.ts';
import { HeadContext, type HiddenHead } from './use-hidden-head.ts';

type By = { readonly du: number; readonly dv: number };
type Grip = 'move' | 'size';

/** The box moved or sized by so much: within the picture, and never too small to be followed. */
export const changedBox = (box: Box, grip: Grip, { du, dv }: By, picture: Size): Box => {
  if (grip === 'move')
    return {
      ...box,
      left: clamp(box.left + du, 0, Math.max(0, picture.width - box.width)),
      top: clamp(box.top + dv, 0, Math.max(0, picture.height - box.height)),
    };
  return {
    ...box,
    width: clamp(box.width + du, LEAST_HEAD_PX, Math.max(LEAST_HEAD_PX, picture.width - box.left)),
    height: clamp(
      box.height + dv,
      LEAST_HEAD_PX,
      Math.max(LEAST_HEAD_PX, picture.height - box.top),
    ),
  };
};

const ARROWS: Readonly<Record<string, By>> = {
  ArrowLeft: { du: -1, dv: 0 },
  ArrowRight: { du: 1, dv: 0 },
  ArrowUp: { du: 0, dv: -1 },
  ArrowDown: { du: 0, dv: 1 },
};

const LOOKS = {
  drawn: 'border-solid border-sheet',
  followed: 'border-dashed border-sheet',
  lost: 'border-dashed border-ochre-pale bg-dusk/30',
} as const;

/** The box of the frame on show, to be moved and sized by pointer and keyboard. */
export function HeadBox({ viewport }: { viewport: Viewport }) {
  const head = useContext(HeadContext);
  const open = useBench((state) => state.desk === 'head');
  const frame = useBench((state) => state.frame);
  const on = head?.heads[frame];
  return open && head && on ? (
    <Shown key={frame} {...{ head, frame, viewport }} box={on.box} state={on.state} />
  ) : null;
}

function Shown({
  head,
  frame,
  viewport,
  box,
  state,
}: {
  head: HiddenHead;
  frame: number;
  viewport: Viewport;
  box: Box;
  state: keyof typeof LOOKS;
}) {
  const { frameSize } = useBenchTools();
  const [moved, setMoved] = useState<Box | null>(null);
  const [grab, setGrab] = useState<{ grip: Grip; x: number; y: number } | null>(null);
  const may = (head.page?.may.save ?? false) && head.run.is !== 'following';
  const shown = moved ?? box;
  const { x, y } = toStage(viewport, framePoint(shown.left, shown.top));

  const finish = () => {
    setGrab(null);
    setMoved(null);
    const inside = moved && boxWithin(moved, frameSize);
    if (inside) head.draw(frame, inside);
  };
  const gripOf = (grip: Grip) => ({
    disabled: !may,
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      event.stopPropagation();
      event.currentTarget.setPointerCapture(event.pointerId);
      event.currentTarget.focus({ preventScroll: true });
      setGrab({ grip, x: event.clientX, y: event.clientY });
    },
    onPointerMove: (event: PointerEvent) => {
      if (grab?.grip !== grip) return;
      const by = {
        du: (event.clientX - grab.x) / viewport.scale,
        dv: (event.clientY - grab.y) / viewport.scale,
      };
      setMoved(changedBox(box, grip, by, frameSize));
    },
    onPointerUp: finish,
    onPointerCancel: () => {
      setGrab(null);
      setMoved(null);
    },
    onKeyDown: (event: KeyboardEvent) => {
      const arrow = ARROWS[event.key];
      if (event.key === 'Escape' && moved) {
        event.stopPropagation();
        setGrab(null);
        setMoved(null);
      }
      if (!arrow || event.ctrlKey || event.metaKey) return;
      event.preventDefault();
      event.stopPropagation();
      const step = event.shiftKey ? 10 : 1;
      const by = { du: arrow.du * step, dv: arrow.dv * step };
      setMoved(changedBox(shown, grip, by, frameSize));
    },
    // held arrows are one gesture, which ends when the key comes up
    onKeyUp: finish,
    onBlur: finish,
  });
  return (
    <>
      <button
        type="button"
        data-head-box
        aria-label="Box around the head. Arrows move it, with Shift by ten pixels."
        className={`absolute cursor-move touch-none border-2 ${LOOKS[state]}`}
        style={{
          ...{ left: x, top: y },
          ...{ width: shown.width * viewport.scale, height: shown.height * viewport.scale },
        }}
        {...gripOf('move')}
      />
      <button
        type="button"
        aria-label="Corner of the box. Arrows make it larger or smaller, with Shift by ten pixels."
        className="absolute size-7 -translate-x-1/2 -translate-y-1/2 cursor-nwse-resize touch-none rounded-full border-2 border-dusk bg-sheet"
        style={{
          left: x + shown.width * viewport.scale,
          top: y + shown.height * viewport.scale,
        }}
        {...gripOf('size')}
      />
    </>
  );
}
