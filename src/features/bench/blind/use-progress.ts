import { useBench } from '../bench-context.ts';
import { useBlind } from './blind-context.ts';

/** Where the frame on show stands in the order, from 1; null on a frame that is not asked for. */
export function useProgress() {
  const { order, next } = useBlind();
  const frame = useBench((state) => state.frame);
  const at = order.findIndex((each) => each.frame === frame);
  const done = order.filter((each) => each.done).length;
  return {
    frame,
    next,
    place: at < 0 ? null : at + 1,
    done,
    of: order.length,
    here: at < 0 ? null : (order[at] ?? null),
    words: at < 0 ? `${done} of ${order.length} done` : `frame ${at + 1} of ${order.length}`,
  };
}
