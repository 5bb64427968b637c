import { describe, expect, it } from 'vitest';
import { inUnit, readLength, writeLength } from './length.ts';

describe('lengths', () => {
  it('reads a unit into millimetres, a decimal comma too', () => {
    expect(readLength('174', 'cm')).toBe(1740);
    expect(readLength(' 0,95 ', 'm')).toBe(950);
    expect(readLength('135', 'mm')).toBe(135);
  });
  it('tells nothing from no number', () => {
    expect(readLength('  ', 'cm')).toBeNull();
    expect(readLength('1.2.3', 'm')).toBeNaN();
    expect(readLength('-3', 'm')).toBeNaN();
    expect(readLength('tall', 'cm')).toBeNaN();
  });
  it('writes what it reads', () => {
    for (const [text, unit] of [
      ['0.955', 'm'],
      ['174.5', 'cm'],
      ['135', 'mm'],
    ] as const)
      expect(writeLength(readLength(text, unit), unit)).toBe(text);
    expect(writeLength(null, 'm')).toBe('');
  });
  it('says a bound in the unit of the field', () => {
    expect(inUnit('At least 700 mm.', 'cm')).toBe('At least 70 cm.');
    expect(inUnit('At most 20000 mm.', 'm')).toBe('At most 20 m.');
  });
});
