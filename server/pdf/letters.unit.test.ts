import { describe, expect, it } from 'vitest';
import { letters } from './letters.ts';

const span = (values: readonly number[]) => [Math.min(...values), Math.max(...values)] as const;

describe('letters as outlines', () => {
  it('are as wide as they say, at any size', async () => {
    const { plain, strong } = await letters();
    for (const face of [plain, strong]) {
      const width = face.width('Standing hip 12° ± 5', 20);
      expect(face.width('Standing hip 12° ± 5', 40)).toBeCloseTo(2 * width, 9);
      const [left, right] = span(
        face
          .rings('Standing hip 12° ± 5', 20)
          .flat()
          .map(({ x }) => x),
      );
      expect(left).toBeGreaterThanOrEqual(0);
      expect(right).toBeLessThanOrEqual(width);
      expect(right).toBeGreaterThan(width - 3);
    }
    expect(strong.width('lift', 20)).toBeGreaterThan(plain.width('lift', 20));
  });

  it('stand about the middle of their line, capitals as high as the font has them', async () => {
    const { plain } = await letters();
    const [top, bottom] = span(
      plain
        .rings('H', 1000)
        .flat()
        .map(({ y }) => y),
    );
    // capitals of Source Sans 3 are 656 of 1000 high; its line is 1024 above and 400 below the base
    expect(bottom - top).toBeCloseTo(656, 0);
    expect(bottom).toBeCloseTo((1024 - 400) / 2, 0);
  });

  it('leave the inside of a letter open', async () => {
    const { plain } = await letters();
    expect(plain.rings('o', 20)).toHaveLength(2);
    expect(plain.rings(' ', 20)).toHaveLength(0);
  });

  it('come from the file that has them', async () => {
    const { plain } = await letters();
    expect(plain.rings('Ж', 20).length).toBeGreaterThan(0);
    expect(plain.width('Жаба', 20)).toBeGreaterThan(plain.width('Ж', 20));
  });
});
