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

/** Streams and container as JSON; of the tags only the stream's length, never a place or a name. */
export const headerArgs = (path: string, demuxer: Demuxer): string[] => [
  '-v',
  'error',
  ...guard(demuxer),
  '-show_entries',
  'stream=index,codec_type,codec_name,pix_fmt,width,height,sample_aspect_ratio,color_transfer,color_range,time_base,duration,nb_frames:stream_disposition=attached_pic:stream_side_data=rotation:format=duration',
  '-of',
  'json',
  '-i',
  path,
];

/** One line per packet: stream, pts, duration, flags. All streams, because a length may be the sound's. */
export const packetArgs = (path: string, demuxer: Demuxer): string[] => [
  '-v',
  'error',
  ...guard(demuxer),
  '-show_entries',
  'packet=stream_index,pts,duration,flags',
  '-of',
  'csv=p=0',
  '-i',
  path,
];

/** Of a copy that was made here: its packets, size and clock in one run. */
export const copyArgs = (path: string): string[] => [
  '-v',
  'error',
  ...guard('mov'),
  '-show_entries',
  'packet=pts,flags:stream=width,height,time_base',
  '-of',
  'csv',
  '-i',
  path,
];
