import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { seconds } from '#shared/timing/units.ts';
import type { LookedAtClip } from '#src/video/look-at-file.ts';
import { type Filmed, judge as judgeFilmed, LARGEST_BYTES } from './judge.ts';

const look = (change: Partial<LookedAtClip> = {}): LookedAtClip => ({
  outcome: 'clip',
  container: 'mov',
  codec: 'hevc',
  width: 1080,
  height: 1920,
  rotation: 90,
  length: seconds(7.2),
  frameRate: { kind: 'constant', fps: 240, gaps: 0 },
  frames: 1728,
  hdr: false,
  decodableHere: false,
  cutShort: false,
  ...change,
});
const filmed: Filmed = {
  details: { view: 'front', supportSide: 'left', mirrored: false },
  filming: {
    distanceMm: 3000,
    lensHeightMm: 950,
    rodMm: 1200,
    beltPointerMm: 135,
    thighPointerMm: 125,
  },
  bodyHeightMm: 1740,
  protocol: STANDARD_PROTOCOL,
};
const judge = (of: Parameters<typeof judgeFilmed>[0], bytes: number) =>
  judgeFilmed(of, bytes, filmed);
const constant = (fps: number) => ({ kind: 'constant' as const, fps, gaps: 0 });

describe('judge', () => {
  it('calls a clip good that this browser cannot even decode', () => {
    expect(judge(look(), 48e6)).toEqual({
      grade: 'good',
      facts: '240 frames per second, 1080 × 1920, 7.2 s',
      advice: [],
      sendable: true,
    });
  });

  it('says so where the rate varies, and leaves out a rate that is not known', () => {
    const varying = { kind: 'variable' as const, averageFps: 57.6, lowestFps: 30, highestFps: 60 };
    expect(judge(look({ frameRate: varying }), 1).facts).toBe(
      'about 58 frames per second, varying, 1080 × 1920, 7.2 s',
    );
    expect(judge(look({ frameRate: null }), 1).facts).toBe('1080 × 1920, 7.2 s');
  });

  it.each([
    ['30 frames per second', { frameRate: constant(30) }, 'weak', /at 60 frames per second/],
    ['24 frames per second', { frameRate: constant(24) }, 'weak', /below 30 .* in 3 frames/],
    ['15 frames per second', { frameRate: constant(15) }, 'again', /below 30 .* in 2 frames/],
    ['720p', { width: 720, height: 1280 }, 'weak', /at 1080p/],
    ['a thumbnail', { width: 180, height: 320 }, 'again', /too small/],
    ['a lying phone', { width: 1920, height: 1080 }, 'weak', /Filmed lying/],
    ['two seconds', { length: seconds(2) }, 'weak', /three still seconds/],
    ['five minutes', { length: seconds(300) }, 'weak', /part that matters/],
    ['a cut file', { cutShort: true }, 'again', /end of the file is missing/],
  ] as const)('says what to do about %s', (_, change, grade, words) => {
    const verdict = judge(look(change), 48e6);
    expect(verdict.grade).toBe(grade);
    expect(verdict.advice.join(' ')).toMatch(words);
    expect(verdict.sendable).toBe(true);
  });

  it('names the gates of the practice, or none while they are not known', () => {
    const usable = look({ frameRate: constant(30) });
    const adviceWith = (protocol: Filmed['protocol']) =>
      judgeFilmed(usable, 48e6, { ...filmed, protocol }).advice;
    expect(
      adviceWith({ ...STANDARD_PROTOCOL, gateFrom: degrees(55), framesPerSecond: 120 }),
    ).toEqual(['Usable; at 120 frames per second 55° and 90° are found more exactly.']);
    expect(adviceWith(null)).toEqual([
      'Usable; at 60 frames per second the gates are found more exactly.',
    ]);
  });

  it('names what is weak about the way of filming after what is wrong with the file', () => {
    const near = { ...filmed, filming: { ...filmed.filming, distanceMm: 1900 } };
    const verdict = judgeFilmed(look({ cutShort: true }), 48e6, near);
    expect(verdict.grade).toBe('again');
    expect(verdict.advice.map((words) => words.slice(0, 11))).toEqual([
      'The end of ',
      'Filmed from',
    ]);
    expect(judgeFilmed(look(), 48e6, near)).toMatchObject({ grade: 'weak', sendable: true });
  });

  it('does not send what is too large to be taken, or holds nothing', () => {
    expect(judge(look(), LARGEST_BYTES + 1)).toMatchObject({ grade: 'again', sendable: false });
    const empty = { outcome: 'empty' as const, advice: 'The file is empty.' };
    expect(judge(empty, 0)).toEqual({
      grade: 'again',
      facts: null,
      advice: ['The file is empty.'],
      sendable: false,
    });
  });

  it('lets a file be sent that only this device cannot read', () => {
    const other = { outcome: 'not-a-video' as const, advice: 'Choose an MP4.' };
    expect(judge(other, 5).sendable).toBe(true);
  });
});
