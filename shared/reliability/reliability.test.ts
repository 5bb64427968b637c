import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import {
  correlation,
  countPairs,
  kappa,
  limitsOfAgreement,
  type Pair,
  smallestDetectable,
  standardError,
  typicalError,
} from './agreement.ts';
import { fisherBelow, fisherQuantile } from './fisher.ts';
import { iccFixed, iccOfMeans, iccOneWay, iccRandom } from './icc.ts';
import { markErrorOf, typicalMarkError } from './mark-repeat.ts';
import { meanSquares, type Ratings } from './variance.ts';

const squaresOf = (ratings: Ratings) => {
  const squares = meanSquares(ratings);
  if (!squares) throw new Error('no mean squares');
  return squares;
};

describe('six targets and four judges', () => {
  // Shrout & Fleiss 1979, Psychological Bulletin 86:420–428 (published, second-hand; more digits
  // and intervals computed)
  const squares = squaresOf([
    [9, 2, 5, 8],
    [6, 1, 3, 2],
    [8, 4, 6, 8],
    [7, 1, 2, 6],
    [10, 5, 6, 9],
    [6, 2, 4, 7],
  ]);

  it('have the mean squares of the paper', () => {
    expect(squares.between).toBeCloseTo(11.2417, 4);
    expect(squares.judge).toBeCloseTo(32.4861, 4);
    expect(squares.error).toBeCloseTo(1.0194, 4);
    expect(squares.within).toBeCloseTo(6.2639, 4);
  });

  it.each([
    ['(1,1)', iccOneWay(squares), 0.1657, -0.133, 0.723],
    ['(2,1)', iccRandom(squares), 0.2898, 0.019, 0.761],
    ['(3,1)', iccFixed(squares), 0.7148, 0.342, 0.946],
  ])('have ICC%s and its interval', (_name, icc, value, low, high) => {
    expect(icc?.value).toBeCloseTo(value, 4);
    expect(icc?.low).toBeCloseTo(low, 3);
    expect(icc?.high).toBeCloseTo(high, 3);
  });

  it('have the ICC of the mean of four', () => {
    const means = iccOfMeans(squares);
    expect(means?.oneWay).toBeCloseTo(0.4428, 4);
    expect(means?.random).toBeCloseTo(0.6201, 4);
    expect(means?.fixed).toBeCloseTo(0.9093, 4);
  });
});

describe('one test twice', () => {
  // Weir 2005, J Strength Cond Res 19:231–240, set A: SEM 7.6 (published, second-hand), rest computed
  const x = [146, 148, 170, 90, 157, 156, 176, 205];
  const y = [140, 152, 152, 99, 145, 153, 167, 218];
  const ratings = x.map((value, i) => [value, y[i] ?? NaN]);

  it('has SEM, smallest change and ICC of the paper', () => {
    const sem = standardError(ratings) ?? NaN;
    expect(squaresOf(ratings).error).toBeCloseTo(57.107, 3);
    expect(sem).toBeCloseTo(7.557, 3);
    expect(smallestDetectable(sem)).toBeCloseTo(20.95, 2);
    expect(iccRandom(squaresOf(ratings))?.value).toBeCloseTo(0.94998, 5);
    expect(iccFixed(squaresOf(ratings))?.value).toBeCloseTo(0.94702, 5);
  });

  it('gives the smallest detectable differences in print', () => {
    // Munro 2012, J Sport Rehabil 21:7–11 (seen); 2° computed
    expect(smallestDetectable(2.72)).toBeCloseTo(7.54, 2);
    expect(smallestDetectable(2)).toBeCloseTo(5.54, 2);
  });
});

describe('peak flow by two meters', () => {
  // Bland & Altman 1986, Lancet 327:307–310 (published from rounded figures, second-hand; rest
  // computed)
  const wright1 = [
    494, 395, 516, 434, 476, 557, 413, 442, 650, 433, 417, 656, 267, 478, 178, 423, 427,
  ];
  const wright2 = [
    490, 397, 512, 401, 470, 611, 415, 431, 638, 429, 420, 633, 275, 492, 165, 372, 421,
  ];
  const mini1 = [
    512, 430, 520, 428, 500, 600, 364, 380, 658, 445, 432, 626, 260, 477, 259, 350, 451,
  ];
  const mini2 = [
    525, 415, 508, 444, 500, 625, 460, 390, 642, 432, 420, 605, 227, 467, 268, 370, 443,
  ];
  const pairs = (a: readonly number[], b: readonly number[]): readonly Pair[] =>
    a.map((value, i) => [value, b[i] ?? NaN]);

  it('has the limits of the paper', () => {
    const limits = limitsOfAgreement(pairs(wright1, mini1), 2);
    expect(limits?.bias).toBeCloseTo(-2.1176, 4);
    expect(limits?.sd).toBeCloseTo(38.7651, 4);
    expect(limits?.biasLow).toBeCloseTo(-22.049, 3);
    expect(limits?.biasHigh).toBeCloseTo(17.814, 3);
    // −79.7 and 75.5 in print
    expect(Math.abs((limits?.low ?? NaN) + 79.7)).toBeLessThan(0.1);
    expect(Math.abs((limits?.high ?? NaN) - 75.5)).toBeLessThan(0.2);
    expect(correlation(pairs(wright1, mini1))).toBeCloseTo(0.9433, 4);
  });

  it('has the typical error of each meter', () => {
    expect(typicalError(pairs(wright1, wright2))).toBeCloseTo(15.307, 3);
    expect(typicalError(pairs(mini1, mini2))).toBeCloseTo(19.911, 3);
  });
});

describe('kappa', () => {
  it('is .400 and .2105 of two known tables (second seen, first computed)', () => {
    expect(
      kappa([
        [20, 5],
        [10, 15],
      ]),
    ).toBeCloseTo(0.4, 12);
    expect(
      kappa([
        [12, 2],
        [4, 2],
      ]),
    ).toBeCloseTo(0.2105, 4);
  });

  it('is unknown of nothing, of a ragged table, and where chance agrees always', () => {
    expect(kappa([])).toBeNull();
    expect(kappa([[1, 2], [3]])).toBeNull();
    expect(kappa([[7]])).toBeNull();
    expect(kappa([[NaN]])).toBeNull();
  });

  it('counts pairs of answers', () => {
    expect(
      countPairs(
        ['early', 'still'],
        [
          ['early', 'early'],
          ['early', 'still'],
        ],
      ),
    ).toEqual([
      [1, 1],
      [0, 0],
    ]);
  });
});

describe('Fisher’s distribution', () => {
  it('is Student’s squared at one degree above (definition) and has printed quantiles (memory)', () => {
    expect(fisherQuantile(0.95, 1, 10)).toBeCloseTo(4.965, 3);
    expect(fisherQuantile(0.95, 5, 10)).toBeCloseTo(3.326, 3);
    expect(fisherQuantile(0.975, 5, 15)).toBeCloseTo(3.576, 3);
    expect(fisherBelow(fisherQuantile(0.3, 4.5, 7.2), 4.5, 7.2)).toBeCloseTo(0.3, 10);
    expect(fisherBelow(-1, 2, 2)).toBe(0);
    expect(fisherBelow(Infinity, 2, 2)).toBe(1);
    expect(fisherQuantile(1, 2, 2)).toBeNaN();
  });
});

describe('too little', () => {
  it('is unknown, never nought', () => {
    expect(meanSquares([])).toBeNull();
    expect(meanSquares([[1, 2]])).toBeNull();
    expect(meanSquares([[1, 2], [3]])).toBeNull();
    expect(
      meanSquares([
        [1, 2],
        [3, NaN],
      ]),
    ).toBeNull();
    expect(typicalError([])).toBeNull();
    expect(limitsOfAgreement([[1, 2]])).toBeNull();
    expect(
      correlation([
        [1, 1],
        [1, 1],
      ]),
    ).toBeNull();
    expect(standardError([])).toBeNull();
    expect(
      iccFixed(
        squaresOf([
          [1, 1],
          [1, 1],
        ]),
      ),
    ).toBeNull();
    expect(
      iccRandom(
        squaresOf([
          [1, 1],
          [1, 1],
        ]),
      ),
    ).toBeNull();
    expect(
      iccOfMeans(
        squaresOf([
          [1, 1],
          [1, 1],
        ]),
      ),
    ).toBeNull();
  });
});

describe('marks placed twice', () => {
  const twice = (frames: number, off: number) =>
    Array.from({ length: frames }, (_, i) => ({
      frame: `f${i}`,
      first: framePoint(100, 200),
      second: framePoint(100 + off, 200 - off),
    }));

  it('give the error of one coordinate', () => {
    expect(typicalMarkError(twice(5, 2))).toBeCloseTo(Math.SQRT2, 12);
    expect(typicalMarkError([])).toBeNull();
  });

  it('replace the assumed 3 px from twenty frames on', () => {
    expect(markErrorOf(twice(19, 2))).toEqual({ anatomicalPx: 3, doublyMarkedFrames: 0 });
    const own = markErrorOf(twice(20, 2));
    expect(own.doublyMarkedFrames).toBe(20);
    expect(own.anatomicalPx).toBeCloseTo(Math.SQRT2, 12);
  });

  it('never make an error of nought', () => {
    expect(markErrorOf(twice(25, 0)).anatomicalPx).toBe(3);
  });
});
