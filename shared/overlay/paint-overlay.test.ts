import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from './paint-overlay.ts';
import type { PaintContext } from './paint-marks.ts';

/** A context that writes down what it is told. */
const recorder = () => {
  const log: (string | number | number[])[][] = [];
  const say =
    (name: string) =>
    (...args: (string | number | number[])[]) =>
      void log.push([name, ...args]);
  const context: PaintContext = {
    save: say('save'),
    restore: say('restore'),
    translate: say('translate'),
    beginPath: say('beginPath'),
    moveTo: say('moveTo'),
    lineTo: say('lineTo'),
    arc: (x, y, r, from, to, back) => void log.push(['arc', x, y, r, from, to, back ? 1 : 0]),
    rect: say('rect'),
    closePath: say('closePath'),
    stroke: () => void log.push(['stroke', context.lineWidth]),
    fill: () => void log.push(['fill']),
    fillText: (text, x, y) => void log.push(['fillText', text, x, y]),
    strokeText: (text, x, y) => void log.push(['strokeText', text, x, y]),
    measureText: (text) => Object.assign(new FakeMetrics(), { width: text.length * 8 }),
    setLineDash: (dash: Iterable<number>) => void log.push(['dash', [...dash]]),
    strokeStyle: '',
    fillStyle: '',
    lineWidth: 0,
    lineCap: 'butt',
    lineJoin: 'miter',
    font: '',
    textAlign: 'left',
    textBaseline: 'alphabetic',
  };
  return { context, log };
};
class FakeMetrics implements TextMetrics {
  width = 0;
  actualBoundingBoxAscent = 0;
  actualBoundingBoxDescent = 0;
  actualBoundingBoxLeft = 0;
  actualBoundingBoxRight = 0;
  alphabeticBaseline = 0;
  emHeightAscent = 0;
  emHeightDescent = 0;
  fontBoundingBoxAscent = 0;
  fontBoundingBoxDescent = 0;
  hangingBaseline = 0;
  ideographicBaseline = 0;
}

const BOUNDS = { width: 350, height: 622 };
const paint = (primitives: readonly Primitive[], scale: number) => {
  const { context, log } = recorder();
  paintOverlay(context, primitives, { viewport: { scale, x: 0, y: 0 }, bounds: BOUNDS });
  return log;
};
const line: Primitive = {
  kind: 'line',
  from: framePoint(10, 10),
  to: framePoint(20, 30),
  role: 'support',
  state: 'placed',
};

describe('paintOverlay', () => {
  it('moves with the zoom but keeps its line width', () => {
    for (const scale of [0.3, 8]) {
      const log = paint([line], scale);
      expect(log.filter(([name]) => name === 'stroke').map(([, width]) => width)).toEqual([6, 1.5]);
      expect(log.find(([name]) => name === 'lineTo')).toEqual(['lineTo', 20 * scale, 30 * scale]);
    }
  });

  it('draws what nobody has looked at thin, dashed and without a dot', () => {
    const ring: Primitive = {
      kind: 'ring',
      at: framePoint(5, 5),
      radius: null,
      role: 'support',
      state: 'tracked',
      landmark: 'kneecap',
    };
    const tracked = paint([ring], 1);
    expect(tracked).toContainEqual(['dash', [3, 2.5]]);
    expect(tracked.filter(([name]) => name === 'fill')).toEqual([]);
    const placed = paint([{ ...ring, state: 'placed' }], 1);
    expect(placed.filter(([name]) => name === 'fill')).toHaveLength(1);
  });

  it('gives an arc the shorter way round', () => {
    const arc: Primitive = {
      kind: 'arc',
      centre: framePoint(0, 0),
      radius: 10,
      from: degrees(180),
      to: degrees(90),
      role: 'lifted',
      state: 'placed',
    };
    const drawn = paint([arc], 2).find(([name]) => name === 'arc');
    // from straight down to straight right: against the clock of the canvas
    expect(drawn).toEqual(['arc', 0, 0, 20, Math.PI / 2, 0, 1]);
  });

  it('scales a ring that a person drew, not the ring of a mark', () => {
    const drawn: Primitive = {
      kind: 'ring',
      at: framePoint(0, 0),
      radius: 30,
      role: 'note',
      state: 'placed',
      landmark: null,
    };
    expect(paint([drawn], 2).find(([name]) => name === 'arc')?.[3]).toBe(60);
    expect(paint([{ ...drawn, radius: null }], 2).find(([name]) => name === 'arc')?.[3]).toBe(6.25);
  });

  it('draws a stroke as one line through all its corners, so that its halo has no seams', () => {
    const drawn: Primitive = {
      kind: 'stroke',
      points: [framePoint(0, 0), framePoint(10, 0), framePoint(10, 20)],
      role: 'note',
      state: 'placed',
    };
    const log = paint([drawn], 2);
    expect(log.filter(([name]) => name === 'lineTo')).toEqual([
      ['lineTo', 20, 0],
      ['lineTo', 20, 40],
    ]);
    // the halo, then the line
    expect(log.filter(([name]) => name === 'stroke')).toHaveLength(2);
  });

  it('keeps words inside the picture', () => {
    const label: Primitive = {
      kind: 'label',
      at: framePoint(345, 2),
      text: 'lift 74° ± 2',
      towards: 'right',
      role: 'lifted',
      state: 'placed',
    };
    const [, , x, y] = paint([label], 1).find(([name]) => name === 'fillText') ?? [];
    expect(x).toBe(350 - 96 - 4);
    expect(y).toBe(16);
  });
});
