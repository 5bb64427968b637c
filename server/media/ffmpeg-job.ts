import { guard } from './ffprobe-args.ts';
import type { Demuxer } from './sniff.ts';

/** One run of ffmpeg as data: made by pure functions, run by `run-ffmpeg.ts`, tested without ffmpeg. */
export interface FfmpegJob {
  readonly input: { readonly path: string; readonly args: readonly string[] };
  /** one filter graph whose labelled ends the outputs map */
  readonly graph: string;
  readonly outputs: readonly JobOutput[];
}

export interface JobOutput {
  readonly path: string;
  readonly args: readonly string[];
}

/** Where the picture lies in a file that has passed the checks. */
export interface PictureSource {
  readonly path: string;
  readonly demuxer: Demuxer;
  readonly streamIndex: number;
}

/** Level of the complaints: warnings tell which decoded frames are known to be wrong. */
const quiet = ['-nostdin', '-nostats', '-v', 'level+warning'];

/** Options before the input. Decoding and filtering get the same bound on threads. */
export const inputArgs = (
  demuxer: Demuxer,
  threads: number,
  more: readonly string[] = [],
): string[] => [
  ...quiet,
  '-progress',
  'pipe:2',
  '-stats_period',
  '0.25',
  '-filter_complex_threads',
  `${threads}`,
  '-threads',
  `${threads}`,
  ...guard(demuxer),
  ...more,
];

/** The command line as ffmpeg sees it. */
export const commandLine = (job: FfmpegJob): string[] => [
  ...job.input.args,
  '-i',
  job.input.path,
  '-y',
  '-filter_complex',
  job.graph,
  ...job.outputs.flatMap((output) => [...output.args, output.path]),
];
