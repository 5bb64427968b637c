import { describe, expect, it } from 'vitest';
import { checkPicture } from './read-header.ts';
import { parseHeader, uprightSize } from './stream-header.ts';

const picture = {
  index: 0,
  codec_type: 'video',
  codec_name: 'hevc',
  pix_fmt: 'yuv420p10le',
  width: 1920,
  height: 1080,
  sample_aspect_ratio: '1:1',
  color_transfer: 'arib-std-b67',
  time_base: '1/600',
  duration: '7.200000',
  nb_frames: '432',
  side_data_list: [{}, { rotation: -90 }],
};
const sound = { index: 1, codec_type: 'audio', codec_name: 'aac', time_base: '1/44100' };
const header = (...streams: object[]) =>
  parseHeader(JSON.stringify({ streams, format: { duration: '7.233000' } }));
const code = (...streams: object[]) => {
  try {
    checkPicture(header(...streams), false);
    return 'taken';
  } catch (error) {
    return error instanceof Error && 'code' in error ? error.code : error;
  }
};

describe('a header', () => {
  it('is read into facts with their units', () => {
    const read = header(picture, sound);
    expect(read).toMatchObject({ attachedPictures: 0, hasSound: true, declaredSeconds: 7.233 });
    expect(checkPicture(read, false)).toMatchObject({
      codec: 'hevc',
      rotation: 90,
      dynamicRange: 'hlg',
      fullRange: false,
      timeBase: { num: 1, den: 600 },
      coded: { width: 1920, height: 1080 },
      upright: { width: 1080, height: 1920 },
      declaredSeconds: 7.2,
      declaredFrames: 432,
    });
  });

  it('leaves unknown what is not written, and never makes it 0', () => {
    const read = parseHeader(
      JSON.stringify({
        streams: [{ index: 0, codec_type: 'video', width: 0, height: 0, duration: 'N/A' }],
      }),
    );
    expect(read.picture).toMatchObject({
      coded: null,
      pixelFormat: null,
      timeBase: null,
      declaredSeconds: null,
      declaredFrames: null,
      pixelAspect: { num: 1, den: 1 },
    });
  });

  it('takes the moving picture, not the cover that may come first', () => {
    const cover = {
      index: 0,
      codec_type: 'video',
      codec_name: 'png',
      disposition: { attached_pic: 1 },
    };
    const read = header(cover, { ...picture, index: 2 });
    expect(read).toMatchObject({ attachedPictures: 1, picture: { index: 2 } });
  });

  it.each([
    ['taken', [picture]],
    ['sound-only', [sound]],
    ['cover-only', [sound, { ...picture, disposition: { attached_pic: 1 } }]],
    ['unsupported-codec', [{ ...picture, codec_name: 'ffv1' }]],
    ['absurd-size', [{ ...picture, width: 16000, height: 8000 }]],
    ['absurd-size', [{ ...picture, sample_aspect_ratio: '100:1' }]],
    ['absurd-size', [{ ...picture, width: 40 }]],
    ['damaged', [{ ...picture, pix_fmt: undefined }]],
    ['damaged', []],
  ])('is %s by its numbers', (expected, streams) => {
    expect(code(...streams)).toBe(expected);
  });
});

describe('the upright size', () => {
  it.each([
    [{ width: 1440, height: 1080 }, { num: 4, den: 3 }, 0, { width: 1920, height: 1080 }],
    [{ width: 1440, height: 1080 }, { num: 4, den: 3 }, 90, { width: 1080, height: 1920 }],
    [{ width: 720, height: 576 }, { num: 16, den: 15 }, 180, { width: 768, height: 576 }],
  ])('of %o', (coded, aspect, rotation, upright) => {
    expect(uprightSize(coded, aspect, rotation)).toEqual(upright);
  });
});
