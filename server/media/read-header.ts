import type { CheckedFile } from './check-file.ts';
import { headerArgs } from './ffprobe-args.ts';
import { acceptedCodecs, maxLongEdge, maxMegapixels, minShortEdge } from './limits.ts';
import { MediaRefusal } from './refusals.ts';
import { runFfprobe } from './run-ffprobe.ts';
import { type FileHeader, parseHeader, type PictureHeader, uprightSize } from './stream-header.ts';
import type { Rational, Size } from './types.ts';

/** The picture of a clip with nothing unknown left. */
export interface KnownPicture extends PictureHeader {
  readonly pixelFormat: string;
  readonly coded: Size;
  readonly timeBase: Rational;
  readonly upright: Size;
}

export interface ReadHeader {
  readonly header: FileHeader;
  readonly picture: KnownPicture;
}

/** @throws MediaRefusal where the header names no picture that can be prepared */
export async function readHeader(file: CheckedFile, signal?: AbortSignal): Promise<ReadHeader> {
  const lines: string[] = [];
  await runFfprobe(headerArgs(file.path, file.demuxer), (line) => void lines.push(line), signal);
  return headerOf(lines.join('\n'), file.cut);
}

/** @throws MediaRefusal where ffprobe's JSON names no picture that can be prepared */
export function headerOf(json: string, cut: boolean): ReadHeader {
  let header: FileHeader;
  try {
    header = parseHeader(json);
  } catch {
    throw unreadable(cut);
  }
  return { header, picture: checkPicture(header, cut) };
}

/** Judges the header's numbers, because absurd ones probe clean. */
export function checkPicture(header: FileHeader, cut: boolean): KnownPicture {
  const { picture, attachedPictures, hasSound } = header;
  if (!picture) {
    if (attachedPictures > 0) throw new MediaRefusal('cover-only', {});
    throw hasSound ? new MediaRefusal('sound-only', {}) : unreadable(cut);
  }
  if (!acceptedCodecs.includes(picture.codec))
    throw new MediaRefusal('unsupported-codec', { codec: picture.codec });
  const { coded, pixelFormat, timeBase } = picture;
  if (!coded || !timeBase) throw unreadable(cut);
  const upright = uprightSize(coded, picture.pixelAspect, picture.rotation);
  for (const { width, height } of [coded, upright]) {
    const [short, long] = [Math.min(width, height), Math.max(width, height)];
    if (short < minShortEdge || long > maxLongEdge || width * height > maxMegapixels * 1e6)
      throw new MediaRefusal('absurd-size', { width, height, maxLongEdge, minShortEdge });
  }
  // the format of the pixels is known only after a first picture was read
  if (!pixelFormat) throw unreadable(cut);
  return { ...picture, coded, pixelFormat, timeBase, upright };
}

const unreadable = (cut: boolean): MediaRefusal =>
  cut
    ? new MediaRefusal('only-header', {})
    : new MediaRefusal('damaged', { fromSeconds: 0, lostFrames: null, haveSeconds: 0 });
