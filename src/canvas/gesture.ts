import { type StagePoint, stagePoint } from '#shared/geometry/points.ts';

/**
 * What pointers on the bare picture mean. One finger or button aims and, let go, places; two
 * fingers move and enlarge. A mark is dragged elsewhere (it is a node of its own).
 */
export type GestureMode = 'place' | 'pan';

interface Pointer {
  readonly id: number;
  readonly at: StagePoint;
}

export type GestureState =
  | { readonly kind: 'idle' }
  | { readonly kind: 'aiming'; readonly pointer: Pointer }
  | { readonly kind: 'panning'; readonly pointer: Pointer; readonly travelled: number }
  | { readonly kind: 'pinching'; readonly a: Pointer; readonly b: Pointer };

export type GestureEvent =
  | { readonly type: 'down'; readonly pointer: Pointer; readonly mode: GestureMode }
  | { readonly type: 'move'; readonly pointer: Pointer }
  | { readonly type: 'up'; readonly pointer: Pointer }
  /** Escape, or the browser took the pointer away: whatever it was, it did not happen. */
  | { readonly type: 'cancel' };

export type GestureEffect =
  | { readonly do: 'aim'; readonly at: StagePoint }
  | { readonly do: 'stop-aiming' }
  | { readonly do: 'place'; readonly at: StagePoint }
  | { readonly do: 'tap'; readonly at: StagePoint }
  | { readonly do: 'pan'; readonly dx: number; readonly dy: number }
  | { readonly do: 'zoom'; readonly at: StagePoint; readonly factor: number };

export const IDLE: GestureState = { kind: 'idle' };

/** A press that wanders less than this is a tap, CSS px. */
const TAP_SLOP = 6;

const apart = (a: StagePoint, b: StagePoint): number => Math.hypot(b.x - a.x, b.y - a.y);
const middle = (a: StagePoint, b: StagePoint): StagePoint =>
  stagePoint((a.x + b.x) / 2, (a.y + b.y) / 2);

type Step = readonly [GestureState, readonly GestureEffect[]];

const down = (state: GestureState, pointer: Pointer, mode: GestureMode): Step => {
  if (state.kind === 'aiming' || state.kind === 'panning')
    return [{ kind: 'pinching', a: state.pointer, b: pointer }, [{ do: 'stop-aiming' }]];
  if (state.kind === 'pinching') return [state, []];
  return mode === 'place'
    ? [{ kind: 'aiming', pointer }, [{ do: 'aim', at: pointer.at }]]
    : [{ kind: 'panning', pointer, travelled: 0 }, []];
};

const move = (state: GestureState, pointer: Pointer): Step => {
  if (state.kind === 'aiming' && state.pointer.id === pointer.id)
    return [{ kind: 'aiming', pointer }, [{ do: 'aim', at: pointer.at }]];
  if (state.kind === 'panning' && state.pointer.id === pointer.id) {
    const dx = pointer.at.x - state.pointer.at.x;
    const dy = pointer.at.y - state.pointer.at.y;
    const travelled = state.travelled + Math.hypot(dx, dy);
    return [{ kind: 'panning', pointer, travelled }, [{ do: 'pan', dx, dy }]];
  }
  if (state.kind !== 'pinching') return [state, []];
  const { a, b } = state;
  if (pointer.id !== a.id && pointer.id !== b.id) return [state, []];
  const next = pointer.id === a.id ? { a: pointer, b } : { a, b: pointer };
  const before = middle(a.at, b.at);
  const after = middle(next.a.at, next.b.at);
  const was = apart(a.at, b.at);
  const factor = was === 0 ? 1 : apart(next.a.at, next.b.at) / was;
  return [
    { kind: 'pinching', ...next },
    [
      { do: 'pan', dx: after.x - before.x, dy: after.y - before.y },
      { do: 'zoom', at: after, factor },
    ],
  ];
};

const up = (state: GestureState, pointer: Pointer): Step => {
  if (state.kind === 'aiming' && state.pointer.id === pointer.id)
    return [IDLE, [{ do: 'place', at: pointer.at }]];
  if (state.kind === 'panning' && state.pointer.id === pointer.id)
    return [IDLE, state.travelled < TAP_SLOP ? [{ do: 'tap', at: pointer.at }] : []];
  if (state.kind !== 'pinching') return [state, []];
  const { a, b } = state;
  // the finger that stays goes on moving the picture; it never places
  if (pointer.id === a.id) return [{ kind: 'panning', pointer: b, travelled: TAP_SLOP }, []];
  if (pointer.id === b.id) return [{ kind: 'panning', pointer: a, travelled: TAP_SLOP }, []];
  return [state, []];
};

export const gesture = (state: GestureState, event: GestureEvent): Step => {
  switch (event.type) {
    case 'down':
      return down(state, event.pointer, event.mode);
    case 'move':
      return move(state, event.pointer);
    case 'up':
      return up(state, event.pointer);
    case 'cancel':
      return [IDLE, state.kind === 'aiming' ? [{ do: 'stop-aiming' }] : []];
  }
};
