import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import * as z from 'zod';
import { repoRoot } from '../../main/root.ts';

const pixel = z.tuple([z.number(), z.number()]);

/** What the demo needs of a clip's truth; tests/fixtures/clips has the whole. */
const truthFile = z.object({
  file: z.string(),
  picture: z.object({ width: z.int(), height: z.int() }),
  view: z.enum(['front', 'lifted-side']),
  setUp: z.object({
    distanceMm: z.number(),
    lensHeightMm: z.number(),
    rodLengthMm: z.number(),
    beltPointerMm: z.number().nullable(),
    thighPointerMm: z.number().nullable(),
  }),
  rod: z.object({ top: pixel, bottom: pixel }),
  reps: z.array(
    z.object({
      supportSide: z.enum(['left', 'right']),
      firstFrame: z.int(),
      lastFrame: z.int(),
      quietFrames: z.tuple([z.int(), z.int()]),
      footOffFrame: z.int(),
      plateauEndFrame: z.int(),
      footDownFrame: z.int(),
      maxLift: z.number(),
    }),
  ),
  frames: z.object({
    /** From the first frame on. */
    tMs: z.array(z.number()),
    values: z.object({ lift: z.array(z.number()) }),
    /** u, v, u, v … pixels of the upright picture, frame by frame. */
    marks: z.record(z.string(), z.array(z.number())),
    /** Runs of frames in which a landmark is covered, both ends included. */
    hidden: z.record(z.string(), z.array(z.tuple([z.int(), z.int()]))),
  }),
});
export type DemoTruth = z.infer<typeof truthFile>;
export type DemoRep = DemoTruth['reps'][number];

const FOLDER = join('tests', 'fixtures', 'clips');

/** The rendered clip itself. */
export const demoFile = (name: string): string => join(repoRoot(), FOLDER, name);

/** The true places of a rendered clip, which no coach ever has. */
export const readTruth = async (clip: string): Promise<DemoTruth> =>
  truthFile.parse(JSON.parse(await readFile(demoFile(`${clip}.json`), 'utf8')));
