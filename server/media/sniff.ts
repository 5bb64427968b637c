import type { Container } from './types.ts';

/** What the first bytes say. The name of the file has no say in it. */
export type Content =
  | { readonly kind: 'clip'; readonly demuxer: Demuxer; readonly container: Container }
  | { readonly kind: 'still'; readonly found: string }
  | { readonly kind: 'playlist'; readonly found: string }
  /** a video, but of a kind that is not read here */
  | { readonly kind: 'foreign'; readonly found: string }
  /** something else that is known */
  | { readonly kind: 'other'; readonly found: string }
  | { readonly kind: 'unknown' };

/** The only two demuxers that ffmpeg is ever allowed to use on a clip. */
export type Demuxer = 'mov' | 'matroska';

/** How many first bytes `sniff` wants to see. */
export const sniffBytes = 4096;

const boxes = new Set(['ftyp', 'moov', 'mdat', 'free', 'skip', 'wide', 'pnot']);
/** Brands of ISO/IEC 23008-12 pictures in the same boxes as a video. */
const pictureBrands = /^(heic|heix|heim|heis|hevc|hevx|mif1|msf1|avif|avis)$/;

type Found = Exclude<Content, { kind: 'clip' | 'unknown' }>;
/* eslint-disable no-control-regex -- signatures of file formats hold control characters */
const magic: readonly (readonly [RegExp, Found])[] = [
  [/^GIF8[79]a/, { kind: 'still', found: 'GIF' }],
  [/^\x89PNG\r\n/, { kind: 'still', found: 'PNG' }],
  [/^\xff\xd8\xff/, { kind: 'still', found: 'JPEG' }],
  [/^RIFF[^]{4}WEBP/, { kind: 'still', found: 'WebP' }],
  [/^BM[^]{4}\0\0\0\0/, { kind: 'still', found: 'BMP' }],
  [/^(II\*\0|MM\0\*)/, { kind: 'still', found: 'TIFF' }],
  [/^(\xef\xbb\xbf)?\s*#EXTM3U/, { kind: 'playlist', found: 'HLS' }],
  [/^(\xef\xbb\xbf)?\s*(<\?xml[^]*?)?<MPD[\s>]/, { kind: 'playlist', found: 'DASH' }],
  [/^(\xef\xbb\xbf)?\s*<(\?xml[^]*?<)?smil[\s>]/i, { kind: 'playlist', found: 'SMIL' }],
  [
    /^(\xef\xbb\xbf)?\s*(ffconcat version|file\s+('[^']+'|\S+)\s*(\n|$))/,
    { kind: 'playlist', found: 'concat' },
  ],
  [/^(\xef\xbb\xbf)?\s*v=0\r?\n[osc]=/, { kind: 'playlist', found: 'SDP' }],
  [/^\s*\[playlist\]/i, { kind: 'playlist', found: 'PLS' }],
  [/^RIFF[^]{4}AVI /, { kind: 'foreign', found: 'an AVI file' }],
  [/^FLV\x01/, { kind: 'foreign', found: 'a Flash video' }],
  [/^\x30\x26\xb2\x75\x8e\x66\xcf\x11/, { kind: 'foreign', found: 'a Windows Media file' }],
  [/^\0\0\x01[\xb3\xba]/, { kind: 'foreign', found: 'an MPEG programme stream' }],
  [/^G[^]{187}G[^]{187}G/, { kind: 'foreign', found: 'an MPEG transport stream' }],
  [/^[^]{4}G[^]{191}G[^]{191}G/, { kind: 'foreign', found: 'an AVCHD transport stream' }],
  [/^OggS/, { kind: 'foreign', found: 'an Ogg file' }],
  [/^RIFF[^]{4}WAVE/, { kind: 'other', found: 'a sound recording' }],
  [/^(ID3|fLaC|\xff[\xfb\xf3\xf2\xf1\xf9])/, { kind: 'other', found: 'a sound recording' }],
  [/^%PDF-/, { kind: 'other', found: 'a PDF document' }],
  [/^PK\x03\x04/, { kind: 'other', found: 'a ZIP archive' }],
  [/^(\x1f\x8b|7z\xbc\xaf|Rar!)/, { kind: 'other', found: 'a compressed archive' }],
  [/^(\x7fELF|MZ)/, { kind: 'other', found: 'a program' }],
];
/* eslint-enable no-control-regex */

/** @param head the first `sniffBytes` of the file, or all of a shorter one */
export function sniff(head: Uint8Array): Content {
  const text = Buffer.from(head).toString('latin1');
  const type = text.slice(4, 8);
  if (boxes.has(type)) return isoContent(text, type);
  if (text.startsWith('\x1a\x45\xdf\xa3')) {
    const webm = text.slice(0, 128).includes('webm');
    return { kind: 'clip', demuxer: 'matroska', container: webm ? 'webm' : 'matroska' };
  }
  return magic.find(([pattern]) => pattern.test(text))?.[1] ?? { kind: 'unknown' };
}

function isoContent(text: string, type: string): Content {
  const brand = type === 'ftyp' ? text.slice(8, 12) : 'qt  ';
  if (pictureBrands.test(brand))
    return { kind: 'still', found: brand.startsWith('avi') ? 'AVIF' : 'HEIC' };
  return { kind: 'clip', demuxer: 'mov', container: brand === 'qt  ' ? 'mov' : 'mp4' };
}

const videoEndings = /\.(mp4|m4v|mov|qt|webm|mkv|avi|3gp|3g2|mts|m2ts|ts|mpg|mpeg|wmv|flv|hevc)$/i;

/** '.mp4' where the name claims to be a video, else null. */
export const claimedVideoEnding = (name: string | undefined): string | null =>
  videoEndings.exec(name ?? '')?.[0].toLowerCase() ?? null;
