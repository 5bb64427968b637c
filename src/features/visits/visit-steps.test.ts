import { describe, expect, it } from 'vitest';
import { aClip } from '#tests/support/records.ts';
import { sidesOf } from './sides-of.ts';
import { nextStep } from './visit-steps.tsx';

const start = { consented: false, mayFilm: false, clips: [], called: false };

describe('nextStep', () => {
  it('follows the job in its order', () => {
    const ready = [aClip()];
    expect(nextStep(start)).toBe('Consent');
    expect(nextStep({ ...start, consented: true })).toBe('Safety');
    expect(nextStep({ ...start, consented: true, mayFilm: true })).toBe('Film');
    expect(nextStep({ ...start, clips: [aClip({ state: 'preparing' })] })).toBe('Upload');
    expect(nextStep({ ...start, clips: ready })).toBe('Call by eye');
    expect(nextStep({ ...start, clips: ready, called: true })).toBe('Mark');
  });
});

describe('sidesOf', () => {
  it('takes both sides of a clip that may hold both, and nothing of a refused one', () => {
    expect(sidesOf([aClip({ supportSide: 'left' })])).toEqual(['left']);
    expect(sidesOf([aClip({ supportSide: null })])).toEqual(['right', 'left']);
    expect(sidesOf([aClip({ state: 'refused' })])).toEqual([]);
  });
});
