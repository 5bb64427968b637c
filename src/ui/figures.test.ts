import { describe, expect, it } from 'vitest';
import {
  capital,
  decimal,
  degrees,
  fileSize,
  howOften,
  inWords,
  metres,
  plusMinus,
  roughly,
  turn,
} from './figures.ts';

describe('figures', () => {
  it('writes a true minus and never a minus before nothing', () => {
    expect(decimal(-1.25)).toBe('−1.3');
    expect(decimal(-0.04)).toBe('0.0');
    expect(degrees(62)).toBe('62.0°');
  });
  it('counts how often in words', () => {
    expect([1, 2, 3].map(howOften)).toEqual(['once', 'twice', 'three times']);
  });
  it('gives turn its sign, external positive', () => {
    expect([turn(6.84), turn(-9), turn(0.04), turn(-0.04)]).toEqual([
      '+6.8°',
      '−9.0°',
      '0.0°',
      '0.0°',
    ]);
    expect(plusMinus(3.64)).toBe('±\u00a03.6');
  });
  it('writes sizes as people read them', () => {
    expect([999, 4_200, 5_120_000, 211_000_000, 1_830_000_000].map(fileSize)).toEqual([
      '999 bytes',
      '4 kB',
      '5.1 MB',
      '211 MB',
      '1.8 GB',
    ]);
  });
  it('rounds the time left so that it does not jump about', () => {
    expect([3, 42, 89, 91, 200, 5400].map(roughly)).toEqual([
      'a few seconds',
      'about 50 s',
      'about 90 s',
      'about 2 min',
      'about 3 min',
      'about 1.5 h',
    ]);
  });
  it('counts up to twelve in words', () => {
    expect([inWords(0), inWords(7), inWords(13), capital(inWords(3))]).toEqual([
      'no',
      'seven',
      '13',
      'Three',
    ]);
    expect(metres(1742)).toBe('1.74 m');
  });
});
