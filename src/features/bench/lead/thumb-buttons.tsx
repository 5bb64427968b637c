import type { LandmarkId } from '#shared/landmarks/types.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { useMarking } from '../actions/use-marking.ts';
import { useUndo } from '../actions/use-undo.ts';
import { useBenchTools } from '../bench-context.ts';
import { DuskButton } from '../dusk-button.tsx';
import { goTo } from '../store/bench-store.ts';

/** What a thumb needs on a phone: a frame back, a frame on, undo, and 'can't see it'. */
export function ThumbButtons({ asked }: { asked: LandmarkId | null }) {
  const { store, times } = useBenchTools();
  const marking = useMarking();
  const { canUndo, undo } = useUndo();
  const step = (by: 1 | -1) => {
    const { frame } = store.getState();
    store.setState({ playing: false });
    goTo(store, frameIndex(Math.max(0, Math.min(times.length - 1, frame + by))));
  };
  return (
    <div className="mt-3 grid grid-cols-4 gap-2">
      <DuskButton className="!px-1" aria-label="One frame back" onClick={() => step(-1)}>
        ← frame
      </DuskButton>
      <DuskButton className="!px-1" aria-label="One frame on" onClick={() => step(1)}>
        frame →
      </DuskButton>
      <DuskButton className="!px-1" disabled={!canUndo} onClick={undo}>
        Undo
      </DuskButton>
      <DuskButton
        className="!px-1 leading-tight"
        disabled={asked === null}
        onClick={() => asked && marking.hide(asked)}
      >
        Can’t see it
      </DuskButton>
    </div>
  );
}
