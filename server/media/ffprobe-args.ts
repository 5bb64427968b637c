import type { Demuxer } from './sniff.ts';

/**
 * What every reading of a stranger's file starts with: local files only, two demuxers only, and the
 * one that the content calls for named, so that the tool guesses nothing. Without the second a DASH
 * file opens local files and ends with 0.
 */
export const guard = (demuxer: Demuxer): string[] => [
  '-protocol_whitelist',
  'file',
  '-format_whitelist',
  'mov,matroska',
  '-f',
  demuxer,
];

/** Of the tags only the stream's length, never a place or a name. */
const headerEntries =
  'stream=index,codec_type,codec_name,pix_fmt,width,height,sample_aspect_ratio,color_transfer,color_range,time_base,duration,nb_frames:stream_disposition=attached_pic:stream_side_data=rotation:format=duration';

/** A stranger's file as JSON, one section on a line. */
const entries = (path: string, demuxer: Demuxer, wanted: string): string[] => [
  '-v',
  'error',
  ...guard(demuxer),
  '-show_entries',
  wanted,
  '-of',
  'json=compact=1',
  '-i',
  path,
];

/** Streams and container. */
export const headerArgs = (path: string, demuxer: Demuxer): string[] =>
  entries(path, demuxer, headerEntries);

/**
 * First every packet of every stream, because a length may be the sound's; then the header. One run
 * for both: starting the tool costs as much as reading a short clip.
 */
export const fileArgs = (path: string, demuxer: Demuxer): string[] =>
  entries(path, demuxer, `packet=codec_type,stream_index,pts,duration,flags:${headerEntries}`);
