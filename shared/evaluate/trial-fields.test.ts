import { describe, expect, it } from 'vitest';
import { finite, field, list, object, optionalFinite, text } from './trial-fields.ts';

describe('a field of a trial', () => {
  it('is said to be lacking, and of what', () => {
    expect(field({ side: 'left' }, 'side')).toBe('left');
    expect(() => field({}, 'side')).toThrow("the trial lacks 'side'");
    expect(() => field({}, 'u', 'mark 3')).toThrow("mark 3 lacks 'u'");
  });

  it('is what it must be, or is named with what it must be', () => {
    expect(object({ a: 1 }, 'rep')).toEqual({ a: 1 });
    for (const other of [null, 3, [1]])
      expect(() => object(other, 'rep')).toThrow('rep must be an object');
    expect(list([1], 'reps')).toEqual([1]);
    expect(() => list({}, 'reps')).toThrow('reps must be a list');
    expect(text('g', 'id')).toBe('g');
    for (const other of ['', 4]) expect(() => text(other, 'id')).toThrow('id must be a text');
    expect(finite(0.5, 'u')).toBe(0.5);
    for (const other of ['1', NaN, Infinity])
      expect(() => finite(other, 'u')).toThrow('u must be a finite number');
  });

  it('is unknown where it is absent or null, never 0', () => {
    expect(optionalFinite(undefined, 'height')).toBeNull();
    expect(optionalFinite(null, 'height')).toBeNull();
    expect(optionalFinite(0, 'height')).toBe(0);
    expect(() => optionalFinite('tall', 'height')).toThrow('height must be a finite number');
  });
});
