import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { bandsOf } from './bands.ts';
import { APART, BOUNDS, type FigureKey, protocolFaults } from './bounds.ts';
import { differences, FIGURES } from './figures.ts';
import { gatesOf, type Protocol, STANDARD_PROTOCOL, STANDARD_RULES } from './protocol.ts';

const keys = (over: Partial<Protocol>) =>
  protocolFaults({ ...STANDARD_PROTOCOL, ...over }).map(({ key }) => key);

describe('the bounds of a protocol', () => {
  it('hold the standard', () => {
    expect(keys({})).toEqual([]);
  });

  it('explain every figure that may be set, once', () => {
    expect(FIGURES.map(({ key }) => key).sort()).toEqual(Object.keys(BOUNDS).sort());
  });

  it.each(Object.keys(BOUNDS) as FigureKey[])('refuse %s beyond either end, and none', (key) => {
    const { low, high } = BOUNDS[key];
    for (const value of [low - 0.01, high + 0.01, NaN, Infinity])
      expect(keys({ [key]: value })).toContain(key);
  });

  it('want the gates apart, but not too far, and no frame that speaks for both', () => {
    const gates = (from: number, to: number): Partial<Protocol> => ({
      gateFrom: degrees(from),
      gateTo: degrees(to),
      liftShort: degrees(to - 5),
    });
    expect(keys(gates(70, 89))).toEqual(['gateTo']);
    expect(keys(gates(50, 96))).toEqual(['gateTo']);
    expect(keys(gates(65, 87))).toEqual(['toBelow']);
    expect(keys(gates(60, 83))).toEqual([]);
    expect(keys({ liftShort: degrees(91) })).toEqual(['liftShort']);
    expect(keys({ liftShort: degrees(79) })).toEqual(['liftShort']);
    expect(keys({ reps: 2.5 })).toEqual(['reps']);
  });

  it('let through only protocols whose bands lie in order', () => {
    const figure = (key: FigureKey) => fc.integer({ min: BOUNDS[key].low, max: BOUNDS[key].high });
    const any = fc.record({
      gateFrom: figure('gateFrom'),
      gateTo: figure('gateTo'),
      fromAbove: figure('fromAbove'),
      toBelow: figure('toBelow'),
      liftShort: figure('liftShort'),
    });
    let passed = 0;
    fc.assert(
      fc.property(any, (given) => {
        const protocol = { ...STANDARD_PROTOCOL, ...given } as Protocol;
        if (protocolFaults(protocol).length > 0) return;
        passed += 1;
        const { from, to } = gatesOf(protocol);
        const bands = bandsOf(protocol);
        expect(to - from).toBeGreaterThanOrEqual(APART.least);
        expect(bands.from.to).toBeLessThan(bands.to.from);
        expect(bands.from.from).toBeGreaterThan(25);
        expect(protocol.liftShort).toBeLessThanOrEqual(to);
      }),
      { seed: 7, numRuns: 2000 },
    );
    expect(passed).toBeGreaterThan(20);
  });
});

describe('the bands of the standard', () => {
  it('are those that every reading so far was made with', () => {
    expect(bandsOf(STANDARD_RULES)).toEqual({
      from: { from: 48, to: 70 },
      to: { from: 78, to: 106 },
      across: { from: 55, to: 95 },
    });
  });
});

describe('what a version changes', () => {
  it('is said figure by figure', () => {
    const to = { ...STANDARD_PROTOCOL, gateFrom: degrees(55), before: 0.98, setUpId: 'a' };
    expect(differences(STANDARD_PROTOCOL, to, () => 'Hall')).toEqual([
      { label: 'Lower gate', from: '60°', to: '55°' },
      { label: 'Turns out before the lower gate', from: '97.5 in 100', to: '98 in 100' },
      { label: 'Set-up of a new visit', from: 'none', to: 'Hall' },
    ]);
    expect(differences(to, { ...to, thighTurnsLittle: true }, () => null)).toEqual([
      { label: 'The planted thigh turns little', from: 'off', to: 'on' },
    ]);
  });
});
