import type { Side, View } from '#shared/contracts/primitives.ts';
import type { ApiProblem } from '#src/api/problem.ts';
import type { LocalLook } from '#src/video/look-at-file.ts';
import type { KeptUpload } from './kept-uploads.ts';

/**
 * `chosen` looked at, waits for the word · `queued` waits for its turn · `sending` · `paused` by hand ·
 * `waiting` for a connection · `sent` the server has it all · `failed` with a problem · `choose-again` known
 * from before a reload: the browser no longer holds the file.
 */
export type UploadPhase =
  'chosen' | 'queued' | 'sending' | 'paused' | 'waiting' | 'sent' | 'failed' | 'choose-again';

/** How a clip was filmed; asked before it is sent. */
export type ClipDetails = { view: View; supportSide: Side | null; mirrored: boolean };

export type UploadItem = ClipDetails & {
  /** Counts up within this tab. */
  key: string;
  visitId: string;
  name: string;
  bytes: number;
  /** Null after a reload, until the same file is chosen again. */
  file: File | null;
  /** Null while it is being looked at. */
  look: LocalLook | null;
  print: string | null;
  phase: UploadPhase;
  sentBytes: number;
  /** Null where not known yet. */
  secondsLeft: number | null;
  problem: ApiProblem | null;
  /** Also the id that the clip will have. */
  uploadId: string | null;
  uploadUrl: string | null;
};

/** A side view shows one leg only, so it needs to know which one is stood on. */
export const detailsComplete = ({ view, supportSide }: ClipDetails): boolean =>
  view === 'front' || view === 'back' || supportSide !== null;

/** Whole percent, never 100 before everything is there. */
export const percentOf = ({ sentBytes, bytes, phase }: UploadItem): number =>
  phase === 'sent' ? 100 : Math.min(99, Math.floor((sentBytes / bytes) * 100));

/** Leaving the page now would break these off. */
export const isUnderWay = ({ phase }: UploadItem): boolean =>
  phase === 'queued' || phase === 'sending' || phase === 'waiting';

export const newItem = (
  key: string,
  visitId: string,
  file: File,
  details: ClipDetails,
): UploadItem => ({
  ...details,
  key,
  visitId,
  name: file.name,
  bytes: file.size,
  file,
  look: null,
  print: null,
  phase: 'chosen',
  sentBytes: 0,
  secondsLeft: null,
  problem: null,
  uploadId: null,
  uploadUrl: null,
});

/** What is written down on the device, so that a reload does not lose it. */
export const keptOf = (
  item: UploadItem & { uploadId: string; uploadUrl: string },
  print: string,
): KeptUpload => ({
  uploadId: item.uploadId,
  uploadUrl: item.uploadUrl,
  visitId: item.visitId,
  print,
  name: item.name,
  bytes: item.bytes,
  view: item.view,
  supportSide: item.supportSide,
  mirrored: item.mirrored,
});

/** An upload from before a reload: known, but without its file. */
export const restoredItem = (key: string, upload: KeptUpload): UploadItem => ({
  ...upload,
  key,
  file: null,
  look: null,
  phase: 'choose-again',
  sentBytes: 0,
  secondsLeft: null,
  problem: null,
});
