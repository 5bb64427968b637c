import { useStore } from 'zustand';
import { useBenchTools } from '../bench-context.ts';
import type { Following } from '../follow/following.ts';
import type { StripLayout } from './strip-layout.ts';

/** Reps that the ankles propose, dashed, with the height of the foot as a hill: nothing is named yet. */
export function StripFound({ layout }: { layout: StripLayout }) {
  const { follow } = useBenchTools();
  return follow ? <Found follow={follow} layout={layout} /> : null;
}

function Found({ follow, layout }: { follow: Following; layout: StripLayout }) {
  const found = useStore(follow.store, (state) => state.found);
  if (!found || 'code' in found) return null;
  const { x, base, top } = layout;
  return (
    <ul aria-label="Reps found">
      {found.map(({ startFrame, endFrame, footOff, top: highest, footDown, supportSide }, n) => (
        <li key={startFrame}>
          <svg className="pointer-events-none absolute inset-0 size-full" aria-hidden="true">
            <path
              d={`M${x(footOff)} ${base}L${x(highest)} ${top + 10}L${x(footDown)} ${base}`}
              className="fill-ink/10 stroke-ink"
              strokeWidth="1.5"
              strokeDasharray="4 3"
            />
          </svg>
          <span
            className="absolute overflow-hidden whitespace-nowrap border-x border-b border-dashed border-ink bg-mud px-1 text-caption"
            style={{
              left: x(startFrame),
              width: Math.max(24, x(endFrame) - x(startFrame)),
              top: base + 6,
              height: 24,
            }}
          >
            found {n + 1}, {supportSide}
          </span>
        </li>
      ))}
    </ul>
  );
}
