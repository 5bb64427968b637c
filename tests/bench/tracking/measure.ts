import { chromium as browserType, type Page } from '@playwright/test';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { frameTable } from '#server/media/probe.ts';
import type { PointToFollow } from '#src/tracking/types.ts';
import { chromium } from '../../e2e/support/chromium.ts';
import { filmFile } from '../../fixtures/tracking/film.ts';
import { makeScene, SPOTS } from '../../fixtures/tracking/scene.ts';
import { startRangeServer } from '../../fixtures/video/range-server.ts';
import { runTool } from '../../fixtures/video/run-tool.ts';
import type { BenchClip } from '../video/page.ts';

export interface TrackingClip extends BenchClip {
  /** Twelve, on the first frame. */
  readonly points: readonly PointToFollow[];
}

const UPRIGHT = { width: 1080, height: 1920 };
/** The scene is cut from such a picture: enlarged to its height, its middle kept, grain added. */
const ENLARGED = UPRIGHT.height / 720;
const CUT = (640 * ENLARGED - UPRIGHT.width) / 2;

/** A sticker of 7 px once it is enlarged. */
const STICKER = { radius: 7 / ENLARGED, grey: 35 };

const local = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** A page beside a clip of 1080 by 1920, all intra, with twelve stickers that move. */
export const onTrackingPage = async <T>(
  work: (page: Page, clip: TrackingClip) => Promise<T>,
): Promise<T> => {
  const folder = await mkdtemp(join(tmpdir(), 'bench-tracking-'));
  const server = await startRangeServer(local('page.ts'), folder, {
    workers: { '/tracking.worker.ts': local('../../../src/tracking/worker/tracking.worker.ts') },
  });
  const browser = await browserType.launch(chromium);
  try {
    const twelfth = { id: 'trunk-side', segment: 'trunk', along: 70, across: 40 } as const;
    const scene = {
      ...makeScene({ cloth: 'plain', sticker: STICKER, topDegrees: 40, exposures: 1 }),
      spots: [...SPOTS, twelfth],
    };
    const film = await filmFile(scene, folder, 'small');
    const path = join(folder, 'clip.mp4');
    const enlarge = `scale=-2:${UPRIGHT.height},crop=${UPRIGHT.width}:${UPRIGHT.height}`;
    await runTool('ffmpeg', [
      ...[
        '-nostdin',
        '-y',
        '-v',
        'error',
        '-i',
        film.path,
        '-vf',
        `${enlarge},noise=alls=5:allf=t`,
      ],
      ...['-fps_mode', 'passthrough', '-enc_time_base', '-1', '-c:v', 'libx264'],
      ...['-preset', 'superfast', '-crf', '23', '-g', '1', '-movflags', '+faststart', path],
    ]);
    const { timeBase, ticks } = await frameTable(path);
    const points = Object.entries(film.truths[0]?.truth ?? {}).map(([id, { u, v }]) => ({
      id,
      keyframes: [{ frame: frameIndex(0), point: framePoint(u * ENLARGED - CUT, v * ENLARGED) }],
    }));
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    await page.goto(server.origin);
    return await work(page, { ...UPRIGHT, timeBase, ticks, url: '/clips/clip.mp4', points });
  } finally {
    await browser.close();
    await server.close();
    await rm(folder, { recursive: true, force: true });
  }
};
