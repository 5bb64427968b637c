import { videoArgs } from './encode-args.ts';
import { type FfmpegJob, inputArgs } from './ffmpeg-job.ts';
import { inGraph } from './in-graph.ts';
import type { FrameTable, Rational, Size } from './types.ts';

/** A script's clock has hundredths of a second, and a frame of a quick clip lasts less than half of one. */
const STRETCH = 100;

/** When something is on show, on the script's stretched clock: from halfway before a frame to halfway after another. */
export const stretched = (
  frames: FrameTable,
  span: { readonly from: number; readonly to: number },
  shown: { readonly from: number; readonly to: number },
): { readonly from: number; readonly to: number } => {
  const { num, den } = frames.timeBase;
  const start = frames.ticks[span.from] ?? 0;
  const at = (index: number) => (((frames.ticks[index] ?? 0) - start) * num * STRETCH) / den;
  return {
    from: shown.from <= span.from ? 0 : (at(shown.from - 1) + at(shown.from)) / 2,
    // nothing comes after the last: one second more
    to: shown.to >= span.to ? at(span.to) + STRETCH : (at(shown.to) + at(shown.to + 1)) / 2,
  };
};

export interface BurnInPlan {
  readonly copy: string;
  readonly timeBase: Rational;
  /** Frames of the copy, both inclusive. */
  readonly from: number;
  readonly to: number;
  /** Of the picture; the film is higher by the band under it. */
  readonly size: Size;
  readonly band: number;
  /** `RRGGBB`: of the band. */
  readonly ground: string;
  /** Where the script lies. */
  readonly script: string;
  readonly path: string;
  readonly gop: number;
  readonly threads: number;
}

/** The span alone, its first frame at 0, each frame at its own time, with the script drawn over picture and band. */
export function burnInJob(plan: BurnInPlan): FfmpegJob {
  const { copy, timeBase, from, to, size, band, ground, script, path, gop, threads } = plan;
  const { width, height } = size;
  const traits = { turned: size, dynamicRange: 'standard', fullRange: false } as const;
  return {
    input: { path: copy, args: inputArgs('mov', threads) },
    graph: `[0:0]${[
      `select='between(n,${from},${to})'`,
      'setpts=PTS-STARTPTS',
      `scale=${width}:${height}`,
      'format=yuv420p',
      'setsar=1',
      `pad=${width}:${height + band}:0:0:color=0x${ground}`,
      `setpts=PTS*${STRETCH}`,
      `ass=f=${inGraph(script)}`,
      `setpts=PTS/${STRETCH}`,
    ].join(',')}[video]`,
    outputs: [
      {
        path,
        args: [
          ...['-map', '[video]', ...videoArgs({ timeBase, threads, traits })],
          // to be kept, not to be sent anew each time: thin lines stay clear
          ...['-preset', 'veryfast', '-crf', '20', '-g', `${gop}`],
        ],
      },
    ],
  };
}
