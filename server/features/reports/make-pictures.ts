import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { boxAround, type Box, boxWithin, grown } from '#shared/geometry/boxes.ts';
import { headsOf } from '#shared/head/heads.ts';
import { keyFrame } from '#server/media/key-frame.ts';
import { keptFilmLongEdge } from '#server/media/limits.ts';
import { fitEven } from '#server/media/picture-filters.ts';
import { product } from '../../db/in-practice.ts';
import type { Ground } from '../../main/ground.ts';
import { Clip } from '../clips/clip.entity.ts';
import { headTrack } from '../heads/current-head.ts';
import { headOfFrames } from './key-frames.ts';
import type { ReportContent, ReportKeyFrames } from './report-content.ts';

/** One key frame as it is printed. */
export interface Still {
  readonly frame: number;
  readonly jpeg: Buffer;
  /** Of the picture, px. */
  readonly size: { readonly width: number; readonly height: number };
  /** Source px: where its upper left corner lies, and how many of its px one of the source is. */
  readonly from: { readonly u: number; readonly v: number };
  readonly scale: number;
}

/** The stills of one side by the place of the side in the report, or why it has none. */
export type Pictures = ReadonlyMap<number, readonly Still[] | string>;

/** Room around the marks, as a share of their longer side. */
const ROOM = 0.12;
/** Not taller than this against its width, so that four stand beside each other. */
const TALLEST = 1.7;

/** What is shown of every one of the frames: all their marks, no more of the room than needed. */
const partOf = ({ drawn }: ReportKeyFrames, source: Still['size']): Box => {
  const [first, ...rest] = drawn.overlay.flatMap(({ marks }) =>
    marks.map(({ u, v }) => ({ left: u, top: v, width: 0.01, height: 0.01 })),
  );
  const whole = { left: 0, top: 0, ...source };
  if (!first) return whole;
  const marks = rest.reduce(boxAround, first);
  const roomy = grown(marks, ROOM * Math.max(marks.width, marks.height));
  const more = Math.max(0, roomy.height / TALLEST - roomy.width) / 2;
  return (
    boxWithin({ ...roomy, left: roomy.left - more, width: roomy.width + 2 * more }, source) ?? whole
  );
};

const CHANGED =
  'the clip, or the box around its head, was changed after this report was asked for. Ask for another report';

const stillsOf = async (
  { inPractice, storage }: Ground,
  practiceId: string,
  wanted: ReportKeyFrames,
  signal: AbortSignal,
): Promise<readonly Still[] | string> => {
  if (wanted.leftOut !== null) return wanted.leftOut;
  const frames = wanted.drawn.overlay.map(({ frame }) => frame);
  const known = await inPractice(product(practiceId), async ({ em }) => {
    const clip = await em.findOne(Clip, { id: wanted.clip });
    const head = clip && (await headOfFrames(em, clip, frames));
    if (!head || typeof head === 'string' || head.id !== wanted.head) return null;
    return { clip, heads: headsOf(headTrack(head, clip)) };
  });
  const { width, height, files } = known?.clip ?? {};
  if (!known || !width || !height || !files?.bench) return CHANGED;
  const source = { width, height };
  const size = fitEven(source, keptFilmLongEdge);
  const part = partOf(wanted, source);
  return storage.withTempDir((folder) =>
    storage.withLocalFile(files.bench ?? '', async (benchCopy) => {
      const stills: Still[] = [];
      for (const frame of frames) {
        const head = known.heads.find((each) => each.frame === frame)?.box;
        if (!head) throw new RangeError(`Frame ${frame} has no box.`);
        const path = join(folder, `${frame}.jpg`);
        const shown = await keyFrame({ benchCopy, frame, source, size, head, part, path, signal });
        stills.push({
          frame,
          jpeg: await readFile(path),
          size: { width: shown.width, height: shown.height },
          from: {
            u: (shown.left * width) / size.width,
            v: (shown.top * height) / size.height,
          },
          scale: size.width / width,
        });
      }
      return stills;
    }),
  );
};

/** The key frames of every side that has some, with the head hidden; made when the report is written. */
export const makePictures = async (
  ground: Ground,
  practiceId: string,
  { sides }: ReportContent,
  signal: AbortSignal,
): Promise<Pictures> => {
  const pictures = new Map<number, readonly Still[] | string>();
  for (const [n, { keyFrames }] of sides.entries())
    if (keyFrames) pictures.set(n, await stillsOf(ground, practiceId, keyFrames, signal));
  return pictures;
};
