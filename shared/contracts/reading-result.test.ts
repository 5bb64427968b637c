import { describe, expect, it } from 'vitest';
import { goldenFiles } from '#shared/evaluate/golden-files.ts';
import { readingInputOf, trialOf } from '#shared/evaluate/trial.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { readingResult } from './reading-result.ts';

const results = goldenFiles().map((file) => ({
  name: file.id,
  result: deriveReading(readingInputOf(trialOf(file), 'belt+thigh')),
}));

describe('what the contract says of a reading', () => {
  it.each(results)('names every field of $name, and no other', ({ result }) => {
    const sent: unknown = JSON.parse(JSON.stringify(result));
    expect(readingResult.parse(sent)).toEqual(sent);
  });

  it('refuses an angle that is not a number, and a fault it does not know', () => {
    const [first] = results;
    if (!first) throw new Error('There are no golden trials.');
    expect(() =>
      readingResult.parse({ ...first.result, reason: { code: 'too-uncertain', u: NaN, limit: 6 } }),
    ).toThrow();
    expect(() => readingResult.parse({ ...first.result, settle: [{ code: 'guess' }] })).toThrow();
  });
});
