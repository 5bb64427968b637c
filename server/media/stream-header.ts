import * as z from 'zod';
import { parseRational } from './rational.ts';
import type { DynamicRange, Rational, Size } from './types.ts';

const stream = z.object({
  index: z.int(),
  codec_type: z.string().optional(),
  codec_name: z.string().optional(),
  pix_fmt: z.string().optional(),
  width: z.int().optional(),
  height: z.int().optional(),
  sample_aspect_ratio: z.string().optional(),
  color_transfer: z.string().optional(),
  color_range: z.string().optional(),
  time_base: z.string().optional(),
  duration: z.string().optional(),
  nb_frames: z.string().optional(),
  disposition: z.object({ attached_pic: z.int().optional() }).optional(),
  side_data_list: z.array(z.object({ rotation: z.number().optional() })).optional(),
});
const header = z.object({
  streams: z.array(stream).default([]),
  format: z.object({ duration: z.string().optional() }).default({}),
});
type Stream = z.infer<typeof stream>;

/** The picture stream as the header describes it; null is unknown. */
export interface PictureHeader {
  readonly index: number;
  readonly codec: string;
  readonly pixelFormat: string | null;
  readonly coded: Size | null;
  readonly rotation: 0 | 90 | 180 | 270;
  readonly pixelAspect: Rational;
  readonly dynamicRange: DynamicRange;
  /** luma 0–255 rather than 16–235 */
  readonly fullRange: boolean;
  readonly timeBase: Rational | null;
  readonly declaredSeconds: number | null;
  readonly declaredFrames: number | null;
}

export interface FileHeader {
  readonly picture: PictureHeader | null;
  /** seconds per tick of every stream, by its index */
  readonly timeBases: ReadonlyMap<number, Rational>;
  readonly attachedPictures: number;
  readonly hasSound: boolean;
  readonly declaredSeconds: number | null;
}

/** @throws SyntaxError or z.ZodError where it is not ffprobe's JSON */
export function parseHeader(json: string): FileHeader {
  const { streams, format } = header.parse(JSON.parse(json));
  const pictures = streams.filter((s) => s.codec_type === 'video');
  const moving = pictures.filter((s) => s.disposition?.attached_pic !== 1);
  return {
    picture: moving[0] ? pictureHeader(moving[0]) : null,
    timeBases: new Map(
      streams.flatMap((s) => {
        const timeBase = parseRational(s.time_base);
        return timeBase ? [[s.index, timeBase] as const] : [];
      }),
    ),
    attachedPictures: pictures.length - moving.length,
    hasSound: streams.some((s) => s.codec_type === 'audio'),
    declaredSeconds: positive(format.duration),
  };
}

function pictureHeader(s: Stream): PictureHeader {
  const known = s.width !== undefined && s.height !== undefined && s.width > 0 && s.height > 0;
  return {
    index: s.index,
    codec: s.codec_name ?? 'unknown',
    pixelFormat: s.pix_fmt && s.pix_fmt !== 'unknown' ? s.pix_fmt : null,
    coded: known ? { width: s.width ?? 0, height: s.height ?? 0 } : null,
    rotation: quarterTurn(s.side_data_list?.find((d) => d.rotation !== undefined)?.rotation ?? 0),
    pixelAspect: parseRational(s.sample_aspect_ratio) ?? { num: 1, den: 1 },
    dynamicRange: dynamicRange(s.color_transfer),
    fullRange: s.color_range === 'pc' || (s.pix_fmt?.startsWith('yuvj') ?? false),
    timeBase: parseRational(s.time_base),
    declaredSeconds: positive(s.duration),
    declaredFrames: positive(s.nb_frames),
  };
}

const positive = (text: string | undefined): number | null => {
  const value = Number(text);
  return text !== undefined && Number.isFinite(value) && value > 0 ? value : null;
};

const dynamicRange = (transfer: string | undefined): DynamicRange =>
  transfer === 'smpte2084' ? 'pq' : transfer === 'arib-std-b67' ? 'hlg' : 'standard';

/** ffprobe counts counter-clockwise; other than quarter turns are painted inside the coded frame. */
function quarterTurn(counterClockwise: number): 0 | 90 | 180 | 270 {
  const clockwise = ((Math.round(-counterClockwise) % 360) + 360) % 360;
  return clockwise === 90 || clockwise === 180 || clockwise === 270 ? clockwise : 0;
}

/** As a player shows it: square pixels by widening the stored width, then the turn. */
export function uprightSize(coded: Size, pixelAspect: Rational, rotation: number): Size {
  const width = Math.max(1, Math.round((coded.width * pixelAspect.num) / pixelAspect.den));
  return rotation === 90 || rotation === 270
    ? { width: coded.height, height: width }
    : { width, height: coded.height };
}
