import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from './derive.ts';

describe('what would settle it', () => {
  it('asks for another camera, and for no mark, where the camera stood at the side', () => {
    const rep = madeRep('right', () => 0);
    const result = deriveReading({
      engine: 1,
      supportSide: 'right',
      set: null,
      thighTurnsLittle: false,
      markError: ASSUMED_MARK_ERROR,
      ownSystematic: null,
      rules: STANDARD_RULES,
      reps: [{ ...rep, camera: { ...rep.camera, view: 'lifted-side' } }],
    });
    expect(result.code).toBe('not-measurable');
    expect(result.settle).toEqual([{ code: 'film-from-front' }]);
  });
});
