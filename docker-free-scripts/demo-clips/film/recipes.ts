import type { ClipPlan } from '../clips.ts';
import { PICTURE } from '../model/camera.ts';
import { PHONE_TICKS, phoneClock } from './timing.ts';

/** A place in the open Atlantic: proof that the product strips where a clip was filmed. */
export const INVENTED_PLACE = '+45.0000-030.0000/';

const RAW_IN = (fps: number): readonly string[] => [
  '-f',
  'rawvideo',
  '-pix_fmt',
  'rgb24',
  '-s',
  `${PICTURE.width}x${PICTURE.height}`,
  '-r',
  String(fps),
  '-i',
  'pipe:0',
];

const COLOURS = [
  '-pix_fmt',
  'yuv420p',
  '-colorspace',
  'bt709',
  '-color_primaries',
  'bt709',
  '-color_trc',
  'bt709',
  '-color_range',
  'tv',
] as const;
const TO_YUV = 'scale=out_color_matrix=bt709:out_range=tv:flags=accurate_rnd+full_chroma_int';

/** Arguments for ffmpeg: upright rgb24 pictures on its standard input, the clip at `out`. */
export const encodeArguments = (
  clip: ClipPlan,
  out: string,
  seconds: number,
): readonly string[] => {
  const start = ['-y', '-v', 'error', ...RAW_IN(clip.fps)];
  const end = ['-bitexact', out];
  switch (clip.container) {
    case 'phone-hevc':
      return [
        ...start,
        ...['-f', 'lavfi', '-t', seconds.toFixed(3)],
        ...['-i', 'anoisesrc=color=brown:amplitude=0.012:seed=7:sample_rate=48000'],
        // lying on its side, 90° against the clock, so that the matrix turns it upright
        ...['-vf', `settb=1/${PHONE_TICKS},setpts=${quoted(phoneClock())},transpose=2,${TO_YUV}`],
        ...['-fps_mode', 'passthrough', '-enc_time_base', `1/${PHONE_TICKS}`],
        ...['-video_track_timescale', String(PHONE_TICKS)],
        ...['-c:v', 'libx265', '-preset', 'fast', '-crf', '24', '-tag:v', 'hvc1'],
        ...['-x265-params', 'log-level=error:keyint=120:bframes=3', ...COLOURS],
        ...['-c:a', 'aac', '-b:a', '48k', '-ac', '1'],
        ...[
          '-metadata',
          `location=${INVENTED_PLACE}`,
          '-metadata',
          `location-eng=${INVENTED_PLACE}`,
        ],
        ...['-f', 'mov', ...end],
      ];
    case 'h264':
      return [
        ...start,
        ...['-vf', TO_YUV, '-c:v', 'libx264', '-preset', 'medium'],
        ...['-crf', String(clip.crf ?? 23)],
        ...['-g', '120', '-an', ...COLOURS, '-movflags', '+faststart', ...end],
      ];
    case 'vp9':
      return [
        ...start,
        ...['-vf', TO_YUV, '-c:v', 'libvpx-vp9', '-crf', '31', '-b:v', '0'],
        ...['-deadline', 'good', '-cpu-used', '4', '-row-mt', '1', '-g', '120', '-an'],
        ...COLOURS,
        ...end,
      ];
  }
};

/** Commas inside an expression must not end the filter. */
const quoted = (expression: string): string => `'${expression}'`;
