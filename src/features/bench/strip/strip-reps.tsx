import { frameIndex } from '#shared/timing/units.ts';
import { useBenchModel, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import type { StripLayout } from './strip-layout.ts';

/** The reps of the whole clip as bars under the time line; a press goes to one. */
export function StripReps({ layout }: { layout: StripLayout }) {
  const { store } = useBenchTools();
  const { reps, current } = useBenchModel();
  return (
    <ul aria-label="Reps of this clip">
      {reps.map(({ rep }) => {
        const from = layout.x(rep.startFrame);
        const to = layout.x(rep.endFrame);
        return (
          <li key={rep.id}>
            <button
              type="button"
              aria-current={rep.id === current?.rep.id || undefined}
              onPointerDown={(event) => event.stopPropagation()}
              onClick={() => {
                store.setState({ repId: rep.id });
                goTo(store, frameIndex(rep.startFrame));
              }}
              className={`absolute overflow-hidden whitespace-nowrap border-x border-b border-ink text-caption ${
                rep.id === current?.rep.id ? 'bg-ink font-bold text-mud' : 'bg-mud text-ink'
              }`}
              style={{
                left: from,
                width: Math.max(24, to - from),
                top: layout.base + 6,
                height: 24,
              }}
            >
              rep {rep.number}, {rep.supportSide}
            </button>
          </li>
        );
      })}
    </ul>
  );
}
