import { useSyncExternalStore } from 'react';
import { frameIndex } from '#shared/timing/units.ts';
import { Button } from '#src/ui/button.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useBench, useBenchTools } from './bench-context.ts';
import { countTouches } from './model/draft.ts';
import { countOf, type QueuedMark } from './queue/queue-core.ts';
import type { QueueLink } from './queue/mark-queue.ts';
import { goTo } from './store/bench-store.ts';

const marksWords = (count: number) => `${count} ${count === 1 ? 'mark' : 'marks'}`;

/** Why marks wait, in words. */
export const waitingWords = (count: number, link: QueueLink): string => {
  const waiting = `${marksWords(count)} waiting`;
  if (link === 'offline') return `${waiting}, no connection`;
  if (link === 'signed-out') return `${waiting}, sign in again`;
  if (link === 'trouble') return `${waiting}, the server does not answer`;
  return 'saving';
};

/** Whether everything placed is kept by the server; what is in dispute or refused, and the way there. */
export function SaveState() {
  const { queue, store, clipId } = useBenchTools();
  const { marks, link } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const { waiting, disputed, refused } = countOf(marks);
  const touched = useBench((state) => countTouches(state.touches));
  const kept = useBench((state) => state.touchesKept);
  const here = (state: QueuedMark['state']['is']) =>
    marks.find((each) => each.state.is === state && each.clipId === clipId);
  const show = (mark: QueuedMark | undefined) => {
    if (!mark) return;
    store.setState({ repId: mark.repId, playing: false });
    goTo(store, frameIndex(mark.frame));
  };
  const firstRefused = marks.find((each) => each.state.is === 'refused');
  return (
    <div className="flex flex-wrap items-center gap-x-4" role="status">
      {disputed > 0 && (
        <button type="button" className="min-h-[44px]" onClick={() => show(here('disputed'))}>
          <StateDot kind="wait">{marksWords(disputed)} to settle</StateDot>
        </button>
      )}
      {firstRefused?.state.is === 'refused' && (
        <span className="flex items-center gap-2">
          <StateDot kind="bad" wrap>
            {marksWords(refused)} refused: {firstRefused.state.reason}
          </StateDot>
          <Button
            look="plain"
            onClick={() =>
              void queue.letGo(
                marks.filter((each) => each.state.is === 'refused').map((each) => each.id),
              )
            }
          >
            Let go
          </Button>
        </span>
      )}
      {waiting > 0 ? (
        <StateDot kind="wait">{waitingWords(waiting, link)}</StateDot>
      ) : touched > 0 ? (
        <StateDot kind="wait">
          {marksWords(touched)} on this {kept ? 'device' : 'page'} only
        </StateDot>
      ) : (
        disputed + refused === 0 && <StateDot kind="done">all saved</StateDot>
      )}
    </div>
  );
}

/** On a phone the waiting marks have a line of their own, with where they are kept. */
export function WaitingLine() {
  const { queue } = useBenchTools();
  const { marks, link } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const { waiting } = countOf(marks);
  if (waiting === 0 || link === 'idle' || link === 'sending') return null;
  return (
    <div className="bg-ochre-pale px-4 py-2 text-note tablet:hidden" role="status">
      <StateDot kind="wait">{waitingWords(waiting, link)}</StateDot>
      <p>Kept on this device; sent when it is back.</p>
    </div>
  );
}
