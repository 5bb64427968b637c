import { useEffect, useRef, type PointerEvent, type RefObject } from 'react';
import { type FramePoint, type StagePoint, stagePoint } from '#shared/geometry/points.ts';
import {
  gesture,
  type GestureEffect,
  type GestureEvent,
  type GestureMode,
  IDLE,
} from './gesture.ts';
import type { Hand } from './hand.ts';
import { panBy, type Size, toFrame, type Viewport, zoomAt } from './viewport.ts';

export interface GestureOptions {
  stage: RefObject<HTMLElement | null>;
  size: Size | null;
  frame: Size;
  viewport: Viewport;
  hand: Hand;
  mode: GestureMode;
  /** True when the press that is beginning has landed on a mark. */
  pressedRef: RefObject<boolean>;
  onViewport: (viewport: Viewport) => void;
  onPlace: (point: FramePoint) => void;
  /** Every place that a held pointer passes; for what is drawn by hand. */
  onPass?: (point: FramePoint) => void;
  onPress: () => void;
}

const WHEEL_PER_PX = 0.0015;

/** Pointers and wheel on the bare picture: aim and place, pan, pinch, enlarge about the pointer. */
export function useGestures(options: GestureOptions) {
  const latest = useRef(options);
  useEffect(() => {
    latest.current = options;
  });
  const state = useRef(IDLE);
  // several pointer events can come before the page shows the viewport that the first one made
  const view = useRef(options.viewport);
  useEffect(() => {
    view.current = options.viewport;
  }, [options.viewport]);

  const at = (event: { clientX: number; clientY: number }): StagePoint => {
    const box = latest.current.stage.current?.getBoundingClientRect();
    return stagePoint(event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0));
  };
  const show = (next: Viewport) => {
    view.current = next;
    latest.current.onViewport(next);
  };
  const effect = (each: GestureEffect) => {
    const { hand, frame, size, onPlace } = latest.current;
    switch (each.do) {
      case 'aim':
        hand.set({ aim: toFrame(view.current, each.at), holding: true });
        latest.current.onPass?.(toFrame(view.current, each.at));
        break;
      case 'stop-aiming':
        hand.set({ holding: false });
        break;
      case 'place':
        hand.set({ holding: false });
        onPlace(toFrame(view.current, each.at));
        break;
      case 'pan':
        if (size) show(panBy(view.current, each, frame, size));
        break;
      case 'zoom':
        if (size) show(zoomAt(view.current, each.at, each.factor, frame, size));
        break;
      case 'tap':
        break;
    }
  };
  const step = (event: GestureEvent) => {
    const [next, effects] = gesture(state.current, event);
    state.current = next;
    effects.forEach(effect);
  };

  useEffect(() => {
    const element = latest.current.stage.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      const { size, frame } = latest.current;
      if (!size) return;
      const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : 1;
      const factor = Math.exp(-event.deltaY * lines * WHEEL_PER_PX * (event.ctrlKey ? 6 : 1));
      const next = zoomAt(view.current, at(event), factor, frame, size);
      // at the whole frame a wheel goes on scrolling the page
      if (next.scale === view.current.scale && !event.ctrlKey) return;
      event.preventDefault();
      show(next);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape' && state.current.kind === 'aiming') {
        event.stopPropagation();
        step({ type: 'cancel' });
      }
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    window.addEventListener('keydown', onKey, true);
    return () => {
      element.removeEventListener('wheel', onWheel);
      window.removeEventListener('keydown', onKey, true);
    };
    // reads everything through refs
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);

  return {
    onPointerDown(event: PointerEvent) {
      const onMark = latest.current.pressedRef.current;
      latest.current.pressedRef.current = false;
      latest.current.onPress();
      if (onMark || event.button > 1) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      step({
        type: 'down',
        pointer: { id: event.pointerId, at: at(event) },
        mode: event.button === 1 ? 'pan' : latest.current.mode,
      });
    },
    onPointerMove(event: PointerEvent) {
      if (state.current.kind === 'idle' && event.pointerType !== 'touch')
        latest.current.hand.set({ aim: toFrame(view.current, at(event)) });
      step({ type: 'move', pointer: { id: event.pointerId, at: at(event) } });
    },
    onPointerUp(event: PointerEvent) {
      step({ type: 'up', pointer: { id: event.pointerId, at: at(event) } });
      if (event.pointerType === 'touch') latest.current.hand.set({ aim: null });
    },
    onPointerCancel() {
      step({ type: 'cancel' });
    },
    onPointerLeave(event: PointerEvent) {
      if (state.current.kind === 'idle' && event.pointerType !== 'touch')
        latest.current.hand.set({ aim: null });
    },
  };
}
