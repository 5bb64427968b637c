import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import { paintOverlay } from '../paint-overlay.ts';
import { OVERLAY_HALO } from '../style.ts';
import type { Primitive } from '../types.ts';
import { type Fill, fillsOf, type Letters } from './fill-context.ts';
import { fillScript } from './fill-script.ts';
import { dashesOf, disc, type Ring, strokeOf, windingOf } from './geometry.ts';

const LETTERS: Letters = {
  width: (text, size) => (text.length * size) / 2,
  rings: (text, size) => [
    [
      { x: 0, y: -size / 2 },
      { x: (text.length * size) / 2, y: -size / 2 },
      { x: (text.length * size) / 2, y: size / 2 },
      { x: 0, y: size / 2 },
    ],
  ],
};
const painted = (primitives: readonly Primitive[], scale = 1): Fill[] =>
  fillsOf(LETTERS, (context) =>
    paintOverlay(context, primitives, {
      viewport: { scale, x: 0, y: 0 },
      bounds: { width: 500, height: 500 },
    }),
  );
const bounds = (rings: readonly Ring[]) => {
  const [xs, ys] = [rings.flat().map(({ x }) => x), rings.flat().map(({ y }) => y)];
  return [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)].map(
    (edge) => Math.round(edge * 100) / 100,
  );
};

/** How often the outlines run around a place; drawn where that is not 0. */
const around = (rings: readonly Ring[], x: number, y: number): number =>
  rings.reduce((sum, ring) => {
    let turns = 0;
    for (const [n, a] of ring.entries()) {
      const b = ring[(n + 1) % ring.length] ?? a;
      const left = (b.x - a.x) * (y - a.y) - (x - a.x) * (b.y - a.y);
      if (a.y <= y && b.y > y && left > 0) turns += 1;
      if (a.y > y && b.y <= y && left < 0) turns -= 1;
    }
    return sum + turns;
  }, 0);

describe('a drawn line as filled outlines', () => {
  const line = [
    { x: 10, y: 10 },
    { x: 30, y: 10 },
  ];
  it('is as wide as its pen, with straight or round ends', () => {
    expect(bounds(strokeOf(line, false, { width: 4, cap: 'butt' }))).toEqual([10, 30, 8, 12]);
    expect(bounds(strokeOf(line, false, { width: 4, cap: 'round' }))).toEqual([8, 32, 8, 12]);
  });

  it('draws a point only with a round end', () => {
    const [point] = line;
    expect(strokeOf(point ? [point, point] : [], false, { width: 4, cap: 'butt' })).toEqual([]);
    expect(bounds(strokeOf(point ? [point] : [], false, { width: 4, cap: 'round' }))).toEqual([
      8, 12, 8, 12,
    ]);
    expect(strokeOf([], false, { width: 4, cap: 'round' })).toEqual([]);
  });

  it('covers what lies within half a pen of it, and nothing beyond', () => {
    const spot = fc.record({
      x: fc.double({ min: 0, max: 100, noNaN: true }),
      y: fc.double({ min: 0, max: 100, noNaN: true }),
    });
    const reach = (line: Ring, x: number, y: number) =>
      Math.min(
        ...line.slice(1).map((b, n) => {
          const a = line[n] ?? b;
          const length = (b.x - a.x) ** 2 + (b.y - a.y) ** 2;
          const share =
            length === 0 ? 0 : ((x - a.x) * (b.x - a.x) + (y - a.y) * (b.y - a.y)) / length;
          const t = Math.max(0, Math.min(1, share));
          return Math.hypot(x - a.x - t * (b.x - a.x), y - a.y - t * (b.y - a.y));
        }),
      );
    fc.assert(
      fc.property(fc.array(spot, { minLength: 2, maxLength: 6 }), spot, (line, { x, y }) => {
        const drawn = around(strokeOf(line, false, { width: 10, cap: 'round' }), x, y) !== 0;
        const away = reach(line, x, y);
        // round ends and bends are corners, and a gentle bend is drawn out
        if (away < 4.9) expect(drawn).toBe(true);
        if (away > 5.3) expect(drawn).toBe(false);
      }),
    );
  });

  it('leaves a ring open in the middle', () => {
    const rings = strokeOf(disc({ x: 20, y: 20 }, 10), true, { width: 2, cap: 'butt' });
    expect(around(rings, 20, 20)).toBe(0);
    expect(around(rings, 30, 20)).not.toBe(0);
    expect(around(rings, 32, 20)).toBe(0);
  });

  it('is cut into dashes that go around corners', () => {
    const corner = [
      { x: 0, y: 0 },
      { x: 4, y: 0 },
      { x: 4, y: 5 },
    ];
    expect(dashesOf(corner, false, [3, 2])).toEqual([
      [
        { x: 0, y: 0 },
        { x: 3, y: 0 },
      ],
      [
        { x: 4, y: 1 },
        { x: 4, y: 4 },
      ],
    ]);
    expect(dashesOf(corner, false, [])).toEqual([corner]);
    expect(dashesOf(corner, true, [100, 1])).toEqual([[...corner, corner[0]]]);
  });
});

describe('what the painter paints, as fills', () => {
  it('is a dark edge under the colour of whose it is', () => {
    const fills = painted([
      {
        kind: 'line',
        from: framePoint(10, 10),
        to: framePoint(60, 10),
        role: 'support',
        state: 'placed',
      },
    ]);
    expect(fills.map(({ colour, alpha }) => [colour, alpha])).toEqual([
      ['#121715', Number(/([\d.]+)\)/.exec(OVERLAY_HALO)?.[1])],
      ['#FF8A5E', 1],
    ]);
    expect(fills.map(({ rings }) => bounds(rings))).toEqual([
      [7, 63, 7, 13],
      [9.25, 60.75, 9.25, 10.75],
    ]);
  });

  it.each(['ring', 'diamond', 'bracket'] as const)('stands about its landmark: %s', (kind) => {
    const mark = {
      kind,
      at: framePoint(100.25, 80.5),
      radius: null,
      landmark: null,
      role: 'midline',
      state: 'conflict',
    } as Primitive;
    for (const { rings } of painted([mark], 2)) {
      const [left = 0, right = 0, top = 0, bottom = 0] = bounds(rings);
      expect((left + right) / 2).toBeCloseTo(200.5, 1);
      expect((top + bottom) / 2).toBeCloseTo(161, 1);
    }
  });

  it('breaks what nobody has looked at into dashes', () => {
    const count = (state: 'placed' | 'tracked') =>
      painted([
        { kind: 'line', from: framePoint(0, 9), to: framePoint(55, 9), role: 'lifted', state },
      ]).at(-1)?.rings.length;
    // one band and two round ends a dash
    expect([count('placed'), count('tracked')]).toEqual([3, 30]);
  });

  it('runs an arc the way it is asked to', () => {
    const arc = (from: number, to: number) =>
      bounds(
        painted([
          {
            kind: 'arc',
            centre: framePoint(100, 100),
            radius: 50,
            from: degrees(from),
            to: degrees(to),
            role: 'lifted',
            state: 'placed',
          },
        ]).at(-1)?.rings ?? [],
      );
    // from straight down to the right, and to the left
    expect(arc(180, 90).map(Math.round)).toEqual([99, 151, 99, 151]);
    expect(arc(180, 270).map(Math.round)).toEqual([49, 101, 99, 151]);
  });

  it('writes words beside their point, with an edge around each letter', () => {
    const fills = painted([
      {
        kind: 'label',
        at: framePoint(100, 100),
        text: 'lift',
        towards: 'right',
        role: 'note',
        state: 'placed',
      },
    ]);
    expect(fills.map(({ rings }) => bounds(rings))).toEqual([
      [111.75, 148.25, 89.75, 110.25],
      [114, 146, 92, 108],
    ]);
  });

  it('draws strokes by hand, corner to corner', () => {
    const points = [framePoint(10, 10), framePoint(20, 10), framePoint(20, 30)];
    const fills = painted([{ kind: 'stroke', points, role: 'note', state: 'placed' }]);
    expect(bounds(fills.at(-1)?.rings ?? []).map(Math.round)).toEqual([9, 21, 9, 31]);
  });

  it('refuses a colour and a place for words that it does not know', () => {
    const paint = (act: (context: CanvasRenderingContext2D) => void) => () =>
      fillsOf(LETTERS, (context) => act(context as unknown as CanvasRenderingContext2D));
    expect(
      paint((context) => {
        context.fillStyle = 'tomato';
        context.arc(0, 0, 5, 0, 7);
        context.fill();
      }),
    ).toThrow(RangeError);
    expect(paint((context) => context.fillText('lift', 0, 0))).toThrow(RangeError);
  });
});

describe('the script of a film', () => {
  it('names when and where each outline stands, and holds no words', () => {
    const ring = [
      { x: 1, y: 2 },
      { x: 3.5, y: 2 },
      { x: 3.5, y: -4.0625 },
    ];
    const script = fillScript({ width: 320, height: 480 }, [
      { from: 0, to: 3661.239, fills: [{ colour: '#FF8A5E', alpha: 0.8, rings: [ring, ring] }] },
    ]);
    expect(script).toContain('PlayResX: 320\nPlayResY: 480\n');
    expect(script.trimEnd().split('\n').at(-1)).toBe(
      String.raw`Dialogue: 0,0:00:00.00,1:01:01.24,Fill,,0,0,0,,{\an7\pos(0,0)\1c&H5E8AFF&\1a&H33&\p4}m 8 16 l 28 16 28 -32 m 8 16 l 28 16 28 -32`,
    );
  });
});

it('turns every piece the same way, so that overlaps are drawn once', () => {
  const star = Array.from({ length: 9 }, (_, n) => ({
    x: 50 + 40 * Math.cos(n * 2.5),
    y: 50 + 40 * Math.sin(n * 2.5),
  }));
  const pieces = strokeOf(star, false, { width: 6, cap: 'round' });
  expect(pieces.length).toBeGreaterThan(8);
  for (const piece of pieces) expect(windingOf(piece)).toBeGreaterThan(0);
});
