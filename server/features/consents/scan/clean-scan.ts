import type { ScanType } from '#shared/contracts/consents.ts';
import { Problem } from '../../../http/problem.ts';
import { cleanJpeg } from './clean-jpeg.ts';
import { cleanPng } from './clean-png.ts';

export interface CleanScan {
  readonly type: ScanType;
  readonly bytes: Buffer;
}

const startsWith = (bytes: Buffer, ...start: number[]): boolean =>
  start.every((byte, n) => bytes[n] === byte);

/** Pages end with this mark (ISO 32000), at most a kilobyte of filling after it. */
const endsAsPdf = (bytes: Buffer): boolean =>
  bytes.subarray(Math.max(0, bytes.length - 1024)).includes('%%EOF');

/**
 * What a file is by its bytes, whatever its name says; pictures without the words, place and device that a phone
 * writes into them. A PDF is kept as it is: a scanner writes no place into it.
 * @throws Problem 'unsupported-media-type'
 */
export const cleanScan = (given: Buffer): CleanScan => {
  if (startsWith(given, 0xff, 0xd8, 0xff)) {
    const bytes = cleanJpeg(given);
    if (bytes) return { type: 'image/jpeg', bytes };
  } else if (startsWith(given, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) {
    const bytes = cleanPng(given);
    if (bytes) return { type: 'image/png', bytes };
  } else if (given.subarray(0, 5).toString('latin1') === '%PDF-' && endsAsPdf(given)) {
    return { type: 'application/pdf', bytes: given };
  }
  throw new Problem(
    'unsupported-media-type',
    'This is no whole PDF, JPEG or PNG. Scan it anew, or save it as one of these.',
  );
};
