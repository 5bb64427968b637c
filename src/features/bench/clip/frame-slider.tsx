import { type KeyboardEvent, type RefObject, useEffect, useEffectEvent } from 'react';
import { liftText } from '#shared/overlay/figures.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { steppedTo } from '#src/ui/stepped-to.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { liftAt } from '../model/hill.ts';
import { goTo } from '../store/bench-store.ts';

const withModifier = ({
  altKey,
  ctrlKey,
  metaKey,
}: Pick<KeyboardEvent, 'altKey' | 'ctrlKey' | 'metaKey'>) => altKey || ctrlKey || metaKey;

/** Where the focus is when a page has just been opened. */
const isNowhere = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.matches('body, main');

/** The other keys move a page that is taller than its window. */
const SIDEWAYS = ['ArrowLeft', 'ArrowRight'];
const pageScrolls = () => document.documentElement.scrollHeight > window.innerHeight;

/**
 * The clip as a slider over its frames (WAI-ARIA pattern): arrows one frame, Page Up and Page Down
 * ten, Home and End the rep's bounds; Enter places the landmark asked for. It lies over the picture
 * and leaves the pointer to the stage. It takes the first such key also where nothing has the focus yet.
 */
export function FrameSlider({
  ref,
  onEnter,
}: {
  ref: RefObject<HTMLDivElement | null>;
  onEnter: () => void;
}) {
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
  const step = (event: Pick<KeyboardEvent, 'key' | 'preventDefault'>) => {
    // keys can come faster than the page is drawn: each counts from where the one before it led
    const to = steppedTo(event.key, store.getState().frame, count, bounds);
    if (to === null) return;
    event.preventDefault();
    store.setState({ playing: false });
    goTo(store, frameIndex(to));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (withModifier(event)) return;
    if (event.key === 'Enter') {
      event.preventDefault();
      onEnter();
      return;
    }
    step(event);
  };
  const fromNowhere = useEffectEvent((event: WindowEventMap['keydown']) => {
    if (event.defaultPrevented || withModifier(event) || !isNowhere(event.target)) return;
    if (!SIDEWAYS.includes(event.key) && pageScrolls()) return;
    if (steppedTo(event.key, store.getState().frame, count, bounds) === null) return;
    ref.current?.focus({ preventScroll: true });
    step(event);
  });
  useEffect(() => {
    const onWindowKey = (event: WindowEventMap['keydown']) => fromNowhere(event);
    window.addEventListener('keydown', onWindowKey);
    return () => window.removeEventListener('keydown', onWindowKey);
  }, []);
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
