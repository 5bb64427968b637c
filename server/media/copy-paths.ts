import { join } from 'node:path';

/** Where the copies of one clip lie. */
export interface CopyPaths {
  readonly bench: string;
  readonly replay: string;
  readonly poster: string;
  readonly strip: string;
}

export const copyPathsIn = (folder: string): CopyPaths => ({
  bench: join(folder, 'bench.mp4'),
  replay: join(folder, 'replay.mp4'),
  poster: join(folder, 'poster.jpg'),
  strip: join(folder, 'strip.jpg'),
});
