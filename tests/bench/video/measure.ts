import { chromium as browserType } from '@playwright/test';
import { mkdtemp, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from '../../e2e/support/chromium.ts';
import { type Gop, prepareCopy } from '../../fixtures/video/prepare-copy.ts';
import { startRangeServer } from '../../fixtures/video/range-server.ts';
import { filmSource } from '../../fixtures/video/source-clips.ts';
import type { FrameIntent } from '#src/video/types.ts';
import type { SideBySide } from './page.ts';

export interface CopyMeasurement {
  readonly gop: Gop;
  readonly bytes: number;
  /** One frame on from the one shown, the next ones being held already. */
  readonly steps: SideBySide;
  /** Any frame of the clip with nothing decoded held. */
  readonly jumps: SideBySide;
}

/**
 * The screen draws as soon as there is something to draw. A screen's rhythm, 16.7 ms at 60 Hz and
 * 8.3 at 120, would add the same wait to both and hide which of them was sooner.
 */
const withoutRhythm = { ...chromium, args: [...chromium.args, '--disable-frame-rate-limit'] };

const STEPS = 150;
const JUMPS = 200;

/** The same places every time, each another frame than the one before. */
const jumpPlaces = (frameCount: number): number[] => {
  const places: number[] = [];
  let state = 20260718;
  while (places.length < JUMPS) {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    const place = Math.floor((state / 2 ** 32) * frameCount);
    if (place !== places.at(-1)) places.push(place);
  }
  return places;
};

/** Films 300 grainy frames of 1920 by 1080, prepares the bench copy, measures both ways on it. */
export const measureCopy = async (gop: Gop): Promise<CopyMeasurement> => {
  const folder = await mkdtemp(join(tmpdir(), 'bench-video-'));
  const entry = fileURLToPath(new URL('page.ts', import.meta.url));
  const server = await startRangeServer(entry, folder);
  const browser = await browserType.launch(withoutRhythm);
  try {
    const copy = await prepareCopy(await filmSource('bench-1920', folder), gop);
    const { timeBase, ticks, width, height } = copy;
    const clip = { timeBase, ticks, width, height, url: `/clips/${relative(folder, copy.path)}` };
    const page = await browser.newPage({ viewport: { width: 1920, height: 1080 } });
    await page.goto(server.origin);

    const measure = (frames: readonly number[], intent: FrameIntent): Promise<SideBySide> =>
      page.evaluate(([f, i]) => window.bench.inTurns(f, i), [frames, intent] as const);

    await page.evaluate((c) => window.bench.open(c, null), clip);
    const places = Array.from({ length: STEPS }, (_, k) => 20 + k);
    const steps = await measure(places, 'step');
    await page.evaluate((c) => window.bench.open(c, 1), clip);
    const jumps = await measure(jumpPlaces(ticks.length), 'scrub');
    return { gop, bytes: (await stat(copy.path)).size, steps, jumps };
  } finally {
    await browser.close();
    await server.close();
    await rm(folder, { recursive: true, force: true });
  }
};

const measured = new Map<Gop, Promise<CopyMeasurement>>();

/** Measured once per run, whoever asks. */
export const measureCopyOnce = (gop: Gop): Promise<CopyMeasurement> => {
  const known = measured.get(gop) ?? measureCopy(gop);
  measured.set(gop, known);
  return known;
};
