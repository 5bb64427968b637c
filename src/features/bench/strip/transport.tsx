import { frameIndex } from '#shared/timing/units.ts';
import { useBench, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';

const BUTTON =
  'grid min-h-[44px] min-w-[40px] place-items-center rounded border border-edge bg-mud whitespace-nowrap px-2 text-note font-bold hover:border-ink hover:bg-sheet';

/** Where the clip stands, a frame back and on, and slow play. */
export function Transport() {
  const { store, times } = useBenchTools();
  const frame = useBench((state) => state.frame);
  const playing = useBench((state) => state.playing);
  const step = (by: 1 | -1) => {
    store.setState({ playing: false });
    goTo(store, frameIndex(Math.max(0, Math.min(times.length - 1, frame + by))));
  };
  return (
    <div className="bench-transport">
      <p className="bench-clock">{((times[frame] ?? 0) / 1000).toFixed(2)} s</p>
      <p className="text-note leading-5 text-soft">
        frame {frame} of {times.length}
      </p>
      <div className="mt-2 flex gap-2">
        <button
          type="button"
          aria-label="One frame back"
          className={`${BUTTON} max-tablet:hidden`}
          onClick={() => step(-1)}
        >
          ←
        </button>
        <button
          type="button"
          aria-label="One frame on"
          className={`${BUTTON} max-tablet:hidden`}
          onClick={() => step(1)}
        >
          →
        </button>
        <button
          type="button"
          aria-pressed={playing}
          aria-label="Play at a quarter of the speed"
          className={BUTTON}
          onClick={() => store.setState({ playing: !playing })}
        >
          {playing ? 'stop' : 'slow ¼'}
        </button>
      </div>
    </div>
  );
}
