/** Why a file is not taken, and what the person can do about it. */

type None = Record<never, never>;

/** The figures that each refusal's sentence needs. Times in seconds from the first frame. */
export interface RefusalFigures {
  empty: None;
  'not-a-video': None;
  'wrong-extension': { extension: string; found: string };
  'still-image': { found: string };
  playlist: { found: string };
  'unsupported-container': { found: string };
  'unsupported-codec': { codec: string };
  'header-missing': None;
  'only-header': None;
  truncated: { haveSeconds: number; expectedSeconds: number | null };
  damaged: { fromSeconds: number | null; lostFrames: number | null; haveSeconds: number };
  'sound-only': None;
  'cover-only': None;
  'one-frame': None;
  'no-timestamps': None;
  'absurd-size': { width: number; height: number; maxLongEdge: number; minShortEdge: number };
  'too-large': { bytes: number; maxBytes: number };
  'too-long': { frames: number | null; maxFrames: number; seconds: number; maxSeconds: number };
  'part-outside': { from: number; to: number; seconds: number };
  'too-costly': None;
}

export type MediaRefusalCode = keyof RefusalFigures;

type Sentences = { [Code in MediaRefusalCode]: (figures: RefusalFigures[Code]) => string };

const s = (seconds: number) =>
  seconds < 120 ? `${seconds.toFixed(1)} s` : `${(seconds / 60).toFixed(1)} min`;
const gb = (bytes: number) => `${(bytes / 1024 ** 3).toFixed(1)} GB`;
const formats = 'MP4, MOV or WebM';

/** One sentence per code: what is wrong, then what to do. */
export const refusalSentences = {
  empty: () => 'The file is empty: choose the clip again and send it once more.',
  'not-a-video': () =>
    `This is not a video: send the clip itself, as the phone recorded it (${formats}).`,
  'wrong-extension': ({ extension, found }) =>
    `The name ends in ${extension}, but the file holds ${found}: send the clip itself (${formats}).`,
  'still-image': ({ found }) =>
    `This is a picture (${found}), not a clip: film the movement and send the video.`,
  playlist: ({ found }) =>
    `This is a playlist (${found}) that points to other files: send the video file itself.`,
  'unsupported-container': ({ found }) =>
    `This is ${found}, which cannot be read here: export the clip as ${formats} and send that.`,
  'unsupported-codec': ({ codec }) =>
    `The picture is stored as ${codec}, which cannot be read here: export the clip as H.264 or HEVC and send that.`,
  'header-missing': () =>
    'The part that says where the pictures are is missing: the file was cut while sending or while recording; send it again, and film again if the phone cannot play it either.',
  'only-header': () =>
    'Only the beginning of the file arrived, without a whole picture: it was cut while sending; send it again.',
  truncated: ({ haveSeconds, expectedSeconds }) =>
    expectedSeconds === null
      ? `The file stops after ${s(haveSeconds)} and its end is missing: it was cut while sending; send it again, or use the part that is there.`
      : `The file stops after ${s(haveSeconds)} of ${s(expectedSeconds)}: it was cut while sending; send it again, or use the part that is there.`,
  damaged: ({ fromSeconds, lostFrames }) =>
    `${damage(fromSeconds, lostFrames)}: send it again, or use the frames that are whole.`,
  'sound-only': () => 'The file holds sound but no picture: choose the clip with the picture.',
  'cover-only': () =>
    'The file holds sound and a cover picture, but no moving picture: choose the clip itself.',
  'one-frame': () =>
    'The clip holds a single frame, so no movement can be seen: film the whole movement and send that.',
  'no-timestamps': () =>
    `The frames of this clip carry no usable times, so nothing can be measured from it: export it again from the phone as ${formats}.`,
  'absurd-size': ({ width, height, maxLongEdge, minShortEdge }) =>
    Math.min(width, height) < minShortEdge
      ? `The picture is ${width} × ${height} pixels, too small to see a landmark in: film at 1080p and send that.`
      : `The picture is ${width} × ${height} pixels, more than can be prepared (${maxLongEdge} on the long edge): film at 1080p or 4K and send that.`,
  'too-large': ({ bytes, maxBytes }) =>
    `The file has ${gb(bytes)}, more than ${gb(maxBytes)}: cut the clip on the phone to the part that matters and send that.`,
  'too-long': ({ frames, maxFrames, seconds, maxSeconds }) =>
    `The clip is ${s(seconds)} long${frames === null ? '' : ` with ${frames} frames`}, more than the ${maxFrames} frames that can be prepared: choose the part that matters, at most ${s(maxSeconds)} of it.`,
  'part-outside': ({ from, to, seconds }) =>
    `The part from ${s(from)} to ${s(to)} does not lie within this clip of ${s(seconds)}: choose a start and a later end inside it.`,
  'too-costly': () =>
    'The clip takes more memory or computing time than one clip may: film at 1080p, or cut it to the part that matters, and send that.',
} satisfies Sentences as Sentences;

function damage(fromSeconds: number | null, lostFrames: number | null): string {
  const from = fromSeconds === null ? '' : ` from ${s(fromSeconds)} on`;
  if (lostFrames === null) return `The file is damaged${from} and cannot be read further`;
  return `The file is damaged${from}: ${lostFrames} ${lostFrames === 1 ? 'frame' : 'frames'} cannot be read`;
}

/** Thrown for a file that is not taken. The sentence can be shown as it is. */
export class MediaRefusal<Code extends MediaRefusalCode = MediaRefusalCode> extends Error {
  override readonly name = 'MediaRefusal';
  readonly code: Code;
  readonly figures: RefusalFigures[Code];

  constructor(code: Code, figures: RefusalFigures[Code]) {
    super(refusalSentences[code](figures));
    this.code = code;
    this.figures = figures;
  }

  get sentence(): string {
    return this.message;
  }

  /** Length that `acceptRemains` would prepare, seconds; null where nothing can be used. */
  get usableSeconds(): number | null {
    const have = 'haveSeconds' in this.figures ? this.figures.haveSeconds : null;
    return typeof have === 'number' && have > 0 ? have : null;
  }
}
