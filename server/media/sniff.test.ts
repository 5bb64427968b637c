import { describe, expect, it } from 'vitest';
import { claimedVideoEnding, sniff } from './sniff.ts';

const bytes = (text: string) => Buffer.from(text, 'latin1');

describe('content by its first bytes', () => {
  it.each([
    ['\0\0\0\x20ftypisom\0\0\x02\0isomiso2', 'mov', 'mp4'],
    ['\0\0\0\x14ftypqt  \0\0\0\0qt  ', 'mov', 'mov'],
    ['\0\0\0\x08wide\0\0\x10\0mdat', 'mov', 'mov'],
    ['\x1a\x45\xdf\xa3\x9f\x42\x86\x81\x01\x42\x82\x84webm', 'matroska', 'webm'],
    ['\x1a\x45\xdf\xa3\xa3\x42\x86\x81\x01\x42\x82\x88matroska', 'matroska', 'matroska'],
  ])('%j is a clip', (text, demuxer, container) => {
    expect(sniff(bytes(text))).toEqual({ kind: 'clip', demuxer, container });
  });

  it.each([
    ['GIF', 'still', 'GIF89a\x01\0'],
    ['PNG', 'still', '\x89PNG\r\n\x1a\n'],
    ['JPEG', 'still', '\xff\xd8\xff\xe0'],
    ['WebP', 'still', 'RIFF\0\0\0\0WEBPVP8 '],
    ['HEIC', 'still', '\0\0\0\x18ftypheic\0\0\0\0'],
    ['AVIF', 'still', '\0\0\0\x18ftypavif\0\0\0\0'],
    ['HLS', 'playlist', '\xef\xbb\xbf\n #EXTM3U\n'],
    ['DASH', 'playlist', '<?xml version="1.0"?>\n<!-- x --><MPD xmlns="">'],
    ['concat', 'playlist', 'ffconcat version 1.0\n'],
    ['concat', 'playlist', `file 'a b.mp4'\n`],
    ['SDP', 'playlist', 'v=0\r\no=- 0 0 IN IP4 127.0.0.1\r\n'],
    ['an AVI file', 'foreign', 'RIFF\0\0\0\0AVI LIST'],
    ['an MPEG transport stream', 'foreign', `G${'\0'.repeat(187)}G${'\0'.repeat(187)}G`],
    ['a ZIP archive', 'other', 'PK\x03\x04'],
    ['a sound recording', 'other', 'ID3\x04'],
  ])('knows %s', (found, kind, text) => {
    expect(sniff(bytes(text))).toEqual({ kind, found });
  });

  it.each(['', 'file the report under F', 'v=0 is not enough', 'hello', '\0\0\0\0\0\0\0\0'])(
    '%j is unknown',
    (text) => {
      expect(sniff(bytes(text))).toEqual({ kind: 'unknown' });
    },
  );

  it('lets a name claim a video only by its ending', () => {
    expect(claimedVideoEnding('Knee lift.MOV')).toBe('.mov');
    expect(claimedVideoEnding('mp4')).toBeNull();
    expect(claimedVideoEnding('a.mp4.pdf')).toBeNull();
    expect(claimedVideoEnding(undefined)).toBeNull();
  });
});
