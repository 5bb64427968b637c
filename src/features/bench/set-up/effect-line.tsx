import { StateDot } from '#src/ui/state-dot.tsx';
import type { Effect } from './effect.ts';

/** What this part of the set-up makes measurable. */
export function EffectLine({ effect }: { effect: Effect }) {
  return (
    <p className="mt-2 text-note">
      <StateDot kind={effect.kind} wrap>
        {effect.text}
      </StateDot>
    </p>
  );
}
