import { useBenchModel } from '../bench-context.ts';

/** Nothing was followed yet: what to do. */
export function FollowPlace() {
  const { reps } = useBenchModel();
  return (
    <p className="mt-1 max-w-[44em]">
      {reps.length === 0
        ? 'Nothing was followed yet. Go to a frame on which the athlete stands still, and touch each landmark once.'
        : 'No mark of this clip was followed: all were placed by hand. Mark one frame of a quiet stance, then have the marks followed through all reps.'}
    </p>
  );
}
