import type { KeyboardEvent, Ref } from 'react';
import { liftText } from '#shared/overlay/figures.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { liftAt } from '../model/hill.ts';
import { goTo } from '../store/bench-store.ts';

const TEN = 10;

/** Where a key of the slider pattern leads; null for other keys. */
export const steppedTo = (
  key: string,
  frame: number,
  count: number,
  bounds: { readonly start: number; readonly end: number },
): FrameIndex | null => {
  const to = {
    ArrowLeft: frame - 1,
    ArrowDown: frame - 1,
    ArrowRight: frame + 1,
    ArrowUp: frame + 1,
    PageUp: frame + TEN,
    PageDown: frame - TEN,
    Home: bounds.start,
    End: bounds.end,
  }[key];
  return to === undefined ? null : frameIndex(Math.max(0, Math.min(count - 1, to)));
};

/**
 * The clip as a slider over its frames (WAI-ARIA pattern): arrows one frame, Page Up and Page Down
 * ten, Home and End the rep's bounds; Enter places the landmark asked for. It lies over the picture
 * and leaves the pointer to the stage.
 */
export function FrameSlider({ ref, onEnter }: { ref: Ref<HTMLDivElement>; onEnter: () => void }) {
  const { store, times } = useBenchTools();
  const { current, figures } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const count = times.length;
  const time = times[frame] ?? 0;
  const shownTime = times[frame];
  const lift =
    current && figures && shownTime !== undefined ? liftAt(current.hill, shownTime) : null;
  const bounds = {
    start: current?.rep.startFrame ?? 0,
    end: current?.rep.endFrame ?? count - 1,
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    if (event.key === 'Enter') {
      event.preventDefault();
      onEnter();
      return;
    }
    // keys can come faster than the page is drawn: each counts from where the one before it led
    const to = steppedTo(event.key, store.getState().frame, count, bounds);
    if (to === null) return;
    event.preventDefault();
    store.setState({ playing: false });
    goTo(store, to);
  };
  return (
    <div
      ref={ref}
      role="slider"
      tabIndex={0}
      aria-label="Frame of the clip"
      aria-orientation="horizontal"
      aria-valuemin={0}
      aria-valuemax={count - 1}
      aria-valuenow={frame}
      aria-valuetext={[
        `frame ${frame} of ${count}`,
        `${(time / 1000).toFixed(2)} s`,
        lift === null ? null : `lift ${liftText(lift, current?.rep.view === 'front', 0)}`,
      ]
        .filter((part) => part !== null)
        .join(', ')}
      className="bench-slider pointer-events-none absolute inset-0"
      onKeyDown={onKeyDown}
    />
  );
}
