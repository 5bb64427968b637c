import { orientationOf, orientationSegment } from './exif-orientation.ts';

const SOI = 0xd8;
const EOI = 0xd9;
const SOS = 0xda;
const COMMENT = 0xfe;
const APP0 = 0xe0;
const APP1 = 0xe1;
const APP2 = 0xe2;
const APP14 = 0xee;
const APP15 = 0xef;

/** JFIF, colour profile and Adobe's colour transform change how the picture looks; all else is words about it. */
const isKept = (marker: number, body: Buffer): boolean => {
  if (marker === COMMENT) return false;
  if (marker < APP0 || marker > APP15) return true;
  if (marker === APP0) return body.subarray(0, 5).toString('latin1') === 'JFIF\0';
  if (marker === APP2) return body.subarray(0, 12).toString('latin1') === 'ICC_PROFILE\0';
  return marker === APP14;
};

/** Behind the compressed data from here: 0xff in it is followed by 0x00 or by a restart mark. */
const behindData = (given: Buffer, from: number): number => {
  let at = from;
  while (at + 1 < given.length) {
    const next = given[at + 1] ?? 0;
    if (given[at] === 0xff && next !== 0 && !(next >= 0xd0 && next <= 0xd7)) break;
    at += 1;
  }
  return at;
};

interface Segment {
  readonly marker: number;
  readonly body: Buffer;
  /** With its marker, and the data of a scan. */
  readonly whole: Buffer;
}

/** Every segment up to the end mark of the picture; null where it is not a whole JPEG. */
const segmentsOf = (given: Buffer): Segment[] | null => {
  const segments: Segment[] = [];
  let at = 2;
  for (;;) {
    // any number of 0xff may stand before a marker
    while (given[at] === 0xff && given[at + 1] === 0xff) at += 1;
    const marker = given[at] === 0xff ? given[at + 1] : undefined;
    if (marker === EOI) return segments;
    if (marker === undefined || marker === SOI || at + 4 > given.length) return null;
    const length = given.readUInt16BE(at + 2);
    const end = at + 2 + length;
    if (length < 2 || end > given.length) return null;
    const next = marker === SOS ? behindData(given, end) : end;
    segments.push({
      marker,
      body: given.subarray(at + 4, end),
      whole: given.subarray(at, next),
    });
    at = next;
  }
};

/**
 * The same picture without its metadata (ITU-T T.81, annex B): which way up it stands is written anew, and what lies
 * behind the end mark goes. Null where it is not a whole JPEG.
 */
export const cleanJpeg = (given: Buffer): Buffer | null => {
  const segments = segmentsOf(given);
  if (!segments?.some(({ marker }) => marker === SOS)) return null;
  const turned = segments
    .filter(({ marker }) => marker === APP1)
    .map(({ body }) => orientationOf(body))
    .find((value) => value !== null && value !== 1);
  const kept = segments.filter(({ marker, body }) => isKept(marker, body));
  // JFIF comes before everything else
  const head = kept.filter(({ marker }) => marker === APP0);
  const rest = kept.filter(({ marker }) => marker !== APP0);
  return Buffer.concat([
    given.subarray(0, 2),
    ...head.map(({ whole }) => whole),
    ...(turned ? [orientationSegment(turned)] : []),
    ...rest.map(({ whole }) => whole),
    Buffer.from([0xff, EOI]),
  ]);
};
