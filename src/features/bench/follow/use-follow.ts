import { createContext, useContext, useEffect, useMemo, useRef } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { isDraft } from '../model/draft.ts';
import { useNewest } from '../use-newest.ts';
import { type FollowActs, useFollowActs } from './use-follow-acts.ts';
import { useTouched } from './use-touched.ts';

export interface Follow extends FollowActs {
  readonly keepTouch: () => boolean;
  /** A hand has placed or moved a mark on the frame on show. */
  readonly placed: (landmark: LandmarkId, point: FramePoint, moved: boolean) => void;
}

const NOTHING: Follow = {
  complete: false,
  start: () => Promise.resolve(),
  take: () => Promise.resolve(),
  adopt: () => undefined,
  again: () => Promise.resolve(),
  keepTouch: () => false,
  placed: () => undefined,
};
export const FollowContext = createContext<Follow>(NOTHING);
export const useFollow = (): Follow => useContext(FollowContext);

/** A nudged mark is followed anew once the hand rests, ms. */
const REST_MS = 700;

/** Everything that follows by itself while the Bench is open. Used once. */
export function useFollowing(): Follow {
  const { store, follow } = useBenchTools();
  const { current, reps } = useBenchModel();
  const acts = useFollowActs();
  const { touched, keepTouch } = useTouched();
  const touches = useBench((state) => state.touches);
  const resting = useRef<ReturnType<typeof setTimeout>>(undefined);
  const newest = useNewest({ acts, current });

  // the person who steps goes first
  useEffect(
    () =>
      store.subscribe((state, before) => {
        if (state.frame !== before.frame) follow?.giveWay();
      }),
    [store, follow],
  );

  // all touched: nothing is left to ask, so following begins
  const { complete } = acts;
  useEffect(() => {
    if (!complete) return;
    const timer = setTimeout(() => void newest.current.acts.start(), REST_MS);
    return () => clearTimeout(timer);
  }, [complete, touches, newest]);

  const named = reps.length > 0;
  useEffect(() => {
    if (named) newest.current.acts.adopt();
  }, [named, newest]);

  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key === 'Escape' && !event.defaultPrevented && keepTouch()) event.preventDefault();
    };
    // before the handles of the marks, which take Escape for themselves
    window.addEventListener('keydown', onKeyDown, { capture: true });
    return () => window.removeEventListener('keydown', onKeyDown, { capture: true });
  }, [keepTouch]);

  useEffect(() => () => clearTimeout(resting.current), []);

  return useMemo(
    () => ({
      ...acts,
      keepTouch,
      placed(landmark, point, moved) {
        if (!moved) void touched(landmark, point);
        const { current: own } = newest.current;
        const { frame } = store.getState();
        if (!follow || !own || isDraft(own) || follow.store.getState().tracks.size === 0) return;
        clearTimeout(resting.current);
        resting.current = setTimeout(
          () => void newest.current.acts.again(own.rep.id, landmark, frame),
          REST_MS,
        );
      },
    }),
    [acts, keepTouch, touched, store, follow, newest],
  );
}
