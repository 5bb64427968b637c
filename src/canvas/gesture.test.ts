import { describe, expect, it } from 'vitest';
import { stagePoint } from '#shared/geometry/points.ts';
import { gesture, type GestureEffect, type GestureEvent, IDLE } from './gesture.ts';

const p = (id: number, x: number, y: number) => ({ id, at: stagePoint(x, y) });
const run = (events: readonly GestureEvent[]): GestureEffect[] => {
  let state = IDLE;
  const effects: GestureEffect[] = [];
  for (const event of events) {
    const [next, done] = gesture(state, event);
    state = next;
    effects.push(...done);
  }
  return effects;
};

describe('one pointer', () => {
  it('aims while held and places where it is let go', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 10, 10), mode: 'place' },
        { type: 'move', pointer: p(1, 12, 11) },
        { type: 'up', pointer: p(1, 13, 11) },
      ]),
    ).toEqual([
      { do: 'aim', at: { x: 10, y: 10 } },
      { do: 'aim', at: { x: 12, y: 11 } },
      { do: 'place', at: { x: 13, y: 11 } },
    ]);
  });

  it('places nothing after Escape', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 10, 10), mode: 'place' },
        { type: 'cancel' },
        { type: 'up', pointer: p(1, 13, 11) },
      ]).map((each) => each.do),
    ).toEqual(['aim', 'stop-aiming']);
  });

  it('moves the picture where nothing is asked for; a short press is a tap', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 10, 10), mode: 'pan' },
        { type: 'move', pointer: p(1, 30, 5) },
        { type: 'up', pointer: p(1, 30, 5) },
      ]),
    ).toEqual([{ do: 'pan', dx: 20, dy: -5 }]);
    expect(
      run([
        { type: 'down', pointer: p(1, 10, 10), mode: 'pan' },
        { type: 'up', pointer: p(1, 10, 10) },
      ]),
    ).toEqual([{ do: 'tap', at: { x: 10, y: 10 } }]);
  });
});

describe('two fingers', () => {
  it('move and enlarge, and place nothing', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 100, 100), mode: 'place' },
        { type: 'down', pointer: p(2, 200, 100), mode: 'place' },
        { type: 'move', pointer: p(2, 300, 100) },
        { type: 'up', pointer: p(1, 100, 100) },
        { type: 'move', pointer: p(2, 310, 100) },
        { type: 'up', pointer: p(2, 310, 100) },
      ]),
    ).toEqual([
      { do: 'aim', at: { x: 100, y: 100 } },
      { do: 'stop-aiming' },
      { do: 'pan', dx: 50, dy: 0 },
      { do: 'zoom', at: { x: 200, y: 100 }, factor: 2 },
      { do: 'pan', dx: 10, dy: 0 },
    ]);
  });

  it('lying on each other enlarge by nothing', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 5, 5), mode: 'pan' },
        { type: 'down', pointer: p(2, 5, 5), mode: 'pan' },
        { type: 'move', pointer: p(2, 9, 5) },
      ]).at(-1),
    ).toEqual({ do: 'zoom', at: { x: 7, y: 5 }, factor: 1 });
  });

  it('a third finger changes nothing', () => {
    expect(
      run([
        { type: 'down', pointer: p(1, 0, 0), mode: 'pan' },
        { type: 'down', pointer: p(2, 10, 0), mode: 'pan' },
        { type: 'down', pointer: p(3, 50, 50), mode: 'pan' },
        { type: 'move', pointer: p(3, 60, 60) },
        { type: 'up', pointer: p(3, 60, 60) },
      ]),
    ).toEqual([{ do: 'stop-aiming' }]);
  });
});
