import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { useBenchTools } from '../bench-context.ts';
import type { FollowState } from './following.ts';

export type FollowingState = 'following' | 'found' | 'none';

const NOBODY = createStore<Pick<FollowState, 'run' | 'found'>>(() => ({
  run: { is: 'idle' },
  found: null,
}));

/** How far following has come. */
export function useFollowState(): FollowingState {
  const { follow } = useBenchTools();
  return useStore(follow?.store ?? NOBODY, ({ run, found }) =>
    run.is === 'following'
      ? 'following'
      : found && !('code' in found) && found.length > 0
        ? 'found'
        : 'none',
  );
}
