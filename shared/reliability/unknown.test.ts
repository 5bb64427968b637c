import { describe, expect, it } from 'vitest';
import { correlation, kappa, limitsOfAgreement, typicalError } from './agreement.ts';
import { valueAgreementOf } from './summary.ts';

describe('agreement', () => {
  it('is unknown of too few pairs or of what is no number', () => {
    expect(typicalError([])).toBeNull();
    expect(typicalError([[NaN, 1]])).toBeNull();
    expect(typicalError([[1, Infinity]])).toBeNull();
    for (const few of [[], [[1, 2]]] as const) {
      expect(limitsOfAgreement(few)).toBeNull();
      expect(correlation(few)).toBeNull();
    }
    const broken = [
      [1, 2],
      [NaN, 3],
    ] as const;
    expect(limitsOfAgreement(broken)).toBeNull();
    expect(correlation(broken)).toBeNull();
  });

  it('has no correlation where one judge never varies', () => {
    expect(
      correlation([
        [1, 5],
        [2, 5],
        [3, 5],
      ]),
    ).toBeNull();
  });

  it('has no kappa of a table that is empty, ragged or counts less than nothing', () => {
    expect(kappa([])).toBeNull();
    expect(kappa([[1, 2], [3]])).toBeNull();
    expect(
      kappa([
        [1, -1],
        [1, 1],
      ]),
    ).toBeNull();
    expect(
      kappa([
        [0, 0],
        [0, 0],
      ]),
    ).toBeNull();
    expect(
      kappa([
        [4, 0],
        [0, 0],
      ]),
    ).toBeNull();
  });

  it('of two judges who never agree is −1 where each answers half and half', () => {
    expect(
      kappa([
        [0, 3],
        [3, 0],
      ]),
    ).toBeCloseTo(-1, 12);
  });

  it('of the same value again and again has a smallest change of nought, and no ICC', () => {
    const alike = valueAgreementOf(Array.from({ length: 6 }, () => [3, 3] as const));
    expect(alike).toMatchObject({ sem: 0, mdc95: 0, typical: 0, why: 'all-alike' });
  });
});
