import { describe, expect, it } from 'vitest';
import { JPEG_DATA, turnedJpeg } from '#tests/support/scans.ts';
import { cleanJpeg } from './clean-jpeg.ts';
import { cleanPng } from './clean-png.ts';
import { cleanScan } from './clean-scan.ts';
import { orientationOf } from './exif-orientation.ts';

describe('a JPEG', () => {
  const clean = cleanJpeg(turnedJpeg()) ?? Buffer.alloc(0);

  it('loses every word about place and device, and its tail', () => {
    expect(clean.includes('GPS-SECRET')).toBe(false);
    expect(clean.includes('Photoshop')).toBe(false);
    expect([...clean.subarray(-2)]).toEqual([0xff, 0xd9]);
  });

  it('keeps its picture and which way up it stands', () => {
    expect(clean.includes('JFIF')).toBe(true);
    const first = clean.indexOf(JPEG_DATA);
    expect(first).toBeGreaterThan(0);
    expect(clean.indexOf(JPEG_DATA, first + 1)).toBeGreaterThan(first);
    expect(orientationOf(clean.subarray(clean.indexOf('Exif')))).toBe(6);
  });

  it('is cleaned once: a second time changes nothing', () => {
    expect(cleanJpeg(clean)).toEqual(clean);
  });

  it('is refused wherever it is cut', () => {
    const whole = turnedJpeg();
    const end = whole.indexOf('GPS-SECRET behind');
    for (let length = 2; length < end; length += 1)
      expect(cleanJpeg(whole.subarray(0, length))).toBeNull();
    expect(cleanJpeg(whole.subarray(0, end))).not.toBeNull();
  });
});

const chunk = (type: string, body = Buffer.alloc(0)): Buffer => {
  const length = Buffer.alloc(4);
  length.writeUInt32BE(body.length);
  return Buffer.concat([length, Buffer.from(type, 'latin1'), body, Buffer.alloc(4)]);
};
const START = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

describe('a PNG', () => {
  const picture = [chunk('IHDR', Buffer.alloc(13)), chunk('IDAT', Buffer.from('data'))];
  const words = ['eXIf', 'tEXt', 'zTXt', 'iTXt', 'tIME', 'prVt'].map((type) =>
    chunk(type, Buffer.from('GPS-SECRET')),
  );
  const whole = Buffer.concat([
    START,
    ...picture.slice(0, 1),
    ...words,
    ...picture.slice(1),
    chunk('IEND'),
    Buffer.from('GPS-SECRET'),
  ]);

  it('keeps its picture and nothing else', () => {
    expect(cleanPng(whole)).toEqual(Buffer.concat([START, ...picture, chunk('IEND')]));
  });

  it('is refused without its end, or where it begins with something else', () => {
    expect(cleanPng(Buffer.concat([START, ...picture]))).toBeNull();
    expect(cleanPng(Buffer.concat([START, ...words, chunk('IEND')]))).toBeNull();
  });
});

describe('a file', () => {
  it('is what its bytes say', () => {
    expect(cleanScan(turnedJpeg()).type).toBe('image/jpeg');
    expect(cleanScan(Buffer.from('%PDF-1.7\n%%EOF')).type).toBe('application/pdf');
    for (const text of [
      '<svg xmlns="http://www.w3.org/2000/svg"/>',
      'GIF89a',
      '',
      ' %PDF-1.7 %%EOF',
    ])
      expect(() => cleanScan(Buffer.from(text))).toThrow('no whole PDF, JPEG or PNG');
  });
});
