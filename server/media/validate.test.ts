import { describe, expect, it } from 'vitest';
import { seconds } from '#shared/timing/units.ts';
import { parsePacket, tableOf } from './frame-table.ts';
import type { ProbedClip } from './probe.ts';
import { MediaRefusal } from './refusals.ts';
import { settle } from './settle.ts';
import { validate } from './validate.ts';

const timeBase = { num: 1, den: 600 };
const size = { width: 1080, height: 1920 };

/** A clip of 30 frames a second from tick 40 on, as measured. */
function probed(frames: number, more: Partial<ProbedClip> = {}, cut = false): ProbedClip {
  const ticks = Array.from({ length: frames }, (_, i) => 40 + 20 * i);
  return {
    file: { path: 'a', bytes: 1, demuxer: 'mov', container: 'mov', cut },
    picture: {
      ...{ index: 0, codec: 'h264', pixelFormat: 'yuv420p', coded: size, upright: size },
      ...{ rotation: 0, pixelAspect: { num: 1, den: 1 }, dynamicRange: 'standard' },
      ...{ fullRange: false, timeBase, declaredSeconds: null, declaredFrames: null },
    },
    frames: tableOf(ticks, timeBase),
    declaredSeconds: frames / 30,
    haveSeconds: frames / 30,
    discarded: 0,
    facts: {
      ...{ container: 'mov', bytes: 1, codec: 'h264', pixelFormat: 'yuv420p', coded: size },
      ...{ upright: size, rotation: 0, pixelAspect: { num: 1, den: 1 }, dynamicRange: 'standard' },
      frameRate: { kind: 'constant', rate: { numerator: 30, denominator: 1 } },
      frameCount: frames,
      duration: seconds(frames / 30),
      startOffset: { ticks: 40, timeBase },
      attachedPictures: 0,
      hasSound: false,
    },
    ...more,
  };
}
const refusal = (act: () => unknown): MediaRefusal => {
  try {
    act();
  } catch (error) {
    if (error instanceof MediaRefusal) return error;
    throw error;
  }
  throw new Error('it was taken');
};

describe('validate', () => {
  it('takes a whole clip, and one whose header rounds', () => {
    expect(validate(probed(120)).expected).toHaveLength(120);
    expect(validate(probed(120, { declaredSeconds: 4.04 })).span).toBeNull();
    expect(validate(probed(120, { declaredSeconds: null })).expected).toHaveLength(120);
  });

  it('says where a cut file stops, and takes the rest only when asked', () => {
    const clip = probed(84, { declaredSeconds: 4 }, true);
    expect(refusal(() => validate(clip))).toMatchObject({
      code: 'truncated',
      usableSeconds: 2.8,
      sentence:
        'The file stops after 2.8 s of 4.0 s: it was cut while sending; send it again, or use the part that is there.',
    });
    expect(validate(clip, { acceptRemains: true }).expected).toHaveLength(84);
    const unknown = probed(84, { declaredSeconds: null }, true);
    expect(refusal(() => validate(unknown)).sentence).toMatch(/stops after 2\.8 s and its end/);
  });

  it('takes a cut file that lost nothing of its picture', () => {
    expect(validate(probed(84, {}, true)).expected).toHaveLength(84);
  });

  it('cuts a part by its own clock, the end not included', () => {
    const part = { from: seconds(1), to: seconds(2) };
    const { span, expected } = validate(probed(120), { part });
    expect(span).toEqual({ from: 640, to: 1240 });
    expect(expected).toHaveLength(30);
    expect(expected[0]).toBe(640);
  });

  it.each([
    [-1, 1],
    [2, 2],
    [3, 2],
    [5, 6],
    [NaN, 2],
    [1, 1.02],
  ])('refuses a part from %d to %d of 4 s', (from, to) => {
    const part = { from: seconds(from), to: seconds(to) };
    expect(refusal(() => validate(probed(120), { part })).code).toBe('part-outside');
  });

  it('prepares 7,200 frames and not one more', () => {
    expect(validate(probed(7200)).expected).toHaveLength(7200);
    expect(refusal(() => validate(probed(7201)))).toMatchObject({
      code: 'too-long',
      figures: { frames: 7201, maxFrames: 7200, maxSeconds: 240 },
    });
    // ten hours at 30 frames a second
    expect(refusal(() => validate(probed(1_080_000))).sentence).toMatch(/600\.0 min long/);
  });
});

describe('decoded frames are compared with those promised', () => {
  const decoded = (places: number[], corruptFrames = 0) => ({
    frames: tableOf(
      places.map((place) => 20 * place),
      timeBase,
    ),
    corruptFrames,
  });
  const all = Array.from({ length: 30 }, (_, i) => i);
  const settled = (clip: ProbedClip, out: ReturnType<typeof decoded>, accept = false) =>
    settle(clip, validate(clip, { acceptRemains: true }), out, accept);

  it('takes a copy that has them all', () => {
    expect(settled(probed(30), decoded(all))).toEqual({ first: 0, lost: [] });
  });

  it('names where the first frame is missing and how many are', () => {
    const holes = all.filter((i) => i < 12 || i > 14);
    expect(refusal(() => settled(probed(30), decoded(holes)))).toMatchObject({
      code: 'damaged',
      figures: { fromSeconds: 0.4, lostFrames: 3 },
      sentence: expect.stringContaining('damaged from 0.4 s on: 3 frames cannot be read'),
    });
    expect(settled(probed(30), decoded(holes), true).lost).toEqual([12, 13, 14]);
  });

  it('calls a missing end of a cut file cut, not damaged', () => {
    const short = decoded(all.slice(0, 29));
    expect(refusal(() => settled(probed(30, {}, true), short)).code).toBe('truncated');
    expect(refusal(() => settled(probed(30), short)).code).toBe('damaged');
  });

  it('counts pictures that the decoder painted over as lost', () => {
    expect(refusal(() => settled(probed(30), decoded(all, 2)))).toMatchObject({
      code: 'damaged',
      figures: { fromSeconds: null, lostFrames: 2 },
    });
    // before the file's own first shown frame they do no harm
    expect(settled(probed(30, { discarded: 5 }), decoded(all, 2)).lost).toEqual([]);
  });

  it('trusts no copy whose clock differs', () => {
    const off = { frames: tableOf([0, 21, 40], timeBase), corruptFrames: 0 };
    expect(() => settled(probed(30), off)).toThrow(/no usable times/);
  });
});

describe('a line of packets', () => {
  const line = (fields: string) => `        { "codec_type": ${fields} },`;
  it.each([
    [
      line('"video", "stream_index": 0, "pts": 1536, "duration": 512, "flags": "K_"'),
      { stream: 0, picture: true, pts: 1536, duration: 512, discarded: false },
    ],
    [
      line('"video", "stream_index": 0, "pts": -512, "duration": 512, "flags": "_D"'),
      { stream: 0, picture: true, pts: -512, duration: 512, discarded: true },
    ],
    [
      line('"audio", "stream_index": 1, "flags": "__"'),
      { stream: 1, picture: false, pts: null, duration: null, discarded: false },
    ],
    [
      line('"video", "stream_index": 0, "pts": 5, "duration": 0, "flags": "K__"').slice(0, -1),
      { stream: 0, picture: true, pts: 5, duration: null, discarded: false },
    ],
    [
      `${line('"audio", "stream_index": 1, "pts": -1024, "duration": 1024, "flags": "KD"').slice(0, -3)},`,
      { stream: 1, picture: false, pts: -1024, duration: 1024, discarded: true },
    ],
    ['', null],
    ['        { "index": 0, "codec_type": "video", "time_base": "1/15360",', null],
  ])('%j', (text, packet) => {
    expect(parsePacket(text)).toEqual(packet);
  });
});
