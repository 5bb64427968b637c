import { useMemo } from 'react';
import { stagePoint } from '#shared/geometry/points.ts';
import type { Size } from '#src/canvas/viewport.ts';
import { fit, zoomAt } from '#src/canvas/viewport.ts';
import { useMarking } from '../actions/use-marking.ts';
import { useUndo } from '../actions/use-undo.ts';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { useLook } from '../look/use-look.ts';
import { useNextFrame } from '../lead/use-suggestion.ts';
import { useAsked } from '../model/use-model.ts';
import { goTo } from '../store/bench-store.ts';
import { MAGNIFICATIONS } from '../store/taste.ts';
import { LOOK, MARK } from '../store/tools.ts';
import type { Act } from './key-map.ts';

const ZOOM_STEP = 1.5;

const stageSize = (): Size | null => {
  const stage = document.querySelector('.bench-clip');
  return stage && { width: stage.clientWidth, height: stage.clientHeight };
};

/** What each act does now; null where it cannot be done. */
export function useActs(): Readonly<Record<Act, (() => void) | null>> {
  const { store, frameSize } = useBenchTools();
  const { may } = useBenchDocument();
  const marking = useMarking();
  const { canUndo, canRedo, undo, redo } = useUndo();
  const asked = useAsked();
  const next = useNextFrame();
  const look = useLook();
  const frame = useBench((state) => state.frame);
  const here = useMemo(
    () => look.waiting.filter((each) => each.frame === frame),
    [look.waiting, frame],
  );
  return useMemo(() => {
    const zoom = (factor: number) => () => {
      const size = stageSize();
      if (!size) return;
      const now = store.getState().viewport ?? fit(frameSize, size);
      const middle = stagePoint(size.width / 2, size.height / 2);
      store.setState({ viewport: zoomAt(now, middle, factor, frameSize, size) });
    };
    return {
      undo: canUndo ? undo : null,
      redo: canRedo ? redo : null,
      hide: asked ? () => marking.hide(asked) : null,
      'next-landmark': asked ? () => store.setState({ chosen: null, lastPlaced: asked }) : null,
      'next-frame-to-mark': next ? () => goTo(store, next.frame) : null,
      'next-unsure': look.next,
      'frame-right': here.length > 0 && may.mark ? () => look.confirm(here) : null,
      play: () => store.setState((state) => ({ playing: !state.playing })),
      comment: may.comment
        ? () => {
            store.setState({ desk: 'comments', playing: false });
            // the field is there after the next painting
            requestAnimationFrame(() =>
              document.querySelector<HTMLElement>('[data-comment-field]')?.focus(),
            );
          }
        : null,
      'zoom-in': zoom(ZOOM_STEP),
      'zoom-out': zoom(1 / ZOOM_STEP),
      'zoom-whole': () => store.setState({ viewport: null }),
      magnify: () =>
        store.setState(({ taste }) => {
          const at = MAGNIFICATIONS.findIndex((each) => each === taste.magnify);
          const magnify = MAGNIFICATIONS[(at + 1) % MAGNIFICATIONS.length] ?? taste.magnify;
          return { taste: { ...taste, magnify } };
        }),
      'move-picture': () =>
        store.setState(({ tool }) => ({ tool: tool.kind === 'look' ? MARK : LOOK })),
    };
  }, [store, frameSize, may, marking, canUndo, canRedo, undo, redo, asked, next, look, here]);
}
