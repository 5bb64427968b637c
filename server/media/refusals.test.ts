import { describe, expect, it } from 'vitest';
import { MediaRefusal, type MediaRefusalCode, type RefusalFigures } from './refusals.ts';

const examples: { [Code in MediaRefusalCode]: RefusalFigures[Code] } = {
  empty: {},
  'not-a-video': {},
  'wrong-extension': { extension: '.mp4', found: 'a PDF document' },
  'still-image': { found: 'GIF' },
  playlist: { found: 'HLS' },
  'unsupported-container': { found: 'an AVI file' },
  'unsupported-codec': { codec: 'ffv1' },
  'header-missing': {},
  'only-header': {},
  truncated: { haveSeconds: 2.8, expectedSeconds: 4 },
  damaged: { fromSeconds: 1.2, lostFrames: 3, haveSeconds: 3.9 },
  'sound-only': {},
  'cover-only': {},
  'one-frame': {},
  'no-timestamps': {},
  'absurd-size': { width: 16000, height: 8000, maxLongEdge: 8192, minShortEdge: 48 },
  'too-large': { bytes: 3 * 1024 ** 3, maxBytes: 2 * 1024 ** 3 },
  'too-long': { frames: 9000, maxFrames: 7200, seconds: 300, maxSeconds: 240 },
  'part-outside': { from: 5, to: 6, seconds: 4 },
  'too-costly': {},
};
const codes = Object.keys(examples) as MediaRefusalCode[];
const sentence = (code: MediaRefusalCode) => new MediaRefusal(code, examples[code]).sentence;

describe('refusals', () => {
  it.each(codes)('%s: one sentence that says what to do', (code) => {
    expect(sentence(code)).toMatch(
      /: .*(send|film|export|choose|cut|use)[^.]*(\.[A-Z0-9 ]|[^.])*\.$/,
    );
    expect(sentence(code)).not.toMatch(/undefined|NaN|null/);
  });

  it('have each their own', () => {
    expect(new Set(codes.map(sentence)).size).toBe(codes.length);
  });

  it('say how much could still be used', () => {
    expect(new MediaRefusal('truncated', examples.truncated).usableSeconds).toBe(2.8);
    expect(
      new MediaRefusal('damaged', { ...examples.damaged, haveSeconds: 0 }).usableSeconds,
    ).toBeNull();
    expect(new MediaRefusal('empty', {}).usableSeconds).toBeNull();
  });
});
