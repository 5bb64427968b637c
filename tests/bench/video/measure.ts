import { chromium as browserType, type Page } from '@playwright/test';
import { mkdtemp, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from '../../e2e/support/chromium.ts';
import { type Gop, prepareCopy } from '../../fixtures/video/prepare-copy.ts';
import { startRangeServer } from '../../fixtures/video/range-server.ts';
import { filmSource } from '../../fixtures/video/source-clips.ts';
import type { Timings } from './page.ts';

/** Ours and the browser's own video on the same copy, in the same run. */
export interface SideBySide {
  readonly ours: Timings;
  readonly browser: Timings;
}

export interface CopyMeasurement {
  readonly gop: Gop;
  readonly bytes: number;
  /** One frame on from the one shown, the next ones being held already. */
  readonly steps: SideBySide;
  /** Any frame of the clip with nothing decoded held. */
  readonly jumps: SideBySide;
}

const ROUNDS = 5;
const STEPS_PER_ROUND = 30;
const JUMPS_PER_ROUND = 40;

const joined = (a: Timings, b: Timings): Timings => ({
  presented: [...a.presented, ...b.presented],
  ready: [...a.ready, ...b.ready],
  wrong: a.wrong + b.wrong,
});

const NONE: Timings = { presented: [], ready: [], wrong: 0 };

/** Turn by turn, so that whatever else the machine does slows both alike. */
const inTurns = async (
  page: Page,
  rounds: readonly (readonly number[])[],
  ours: (frames: readonly number[]) => Promise<Timings>,
): Promise<SideBySide> => {
  let result: SideBySide = { ours: NONE, browser: NONE };
  for (const frames of rounds) {
    const mine = await ours(frames);
    const theirs = await page.evaluate((f) => window.bench.browser(f), frames);
    result = { ours: joined(result.ours, mine), browser: joined(result.browser, theirs) };
  }
  return result;
};

const span = (first: number, count: number): number[] =>
  Array.from({ length: count }, (_, k) => first + k);

/** The same places every time, each another frame than the one before. */
const jumpRounds = (frameCount: number): number[][] => {
  let state = 20260718;
  let before = 0;
  const next = (): number => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    const place = Math.floor((state / 2 ** 32) * frameCount);
    before = place === before ? (place + 1) % frameCount : place;
    return before;
  };
  return span(0, ROUNDS).map(() => span(0, JUMPS_PER_ROUND).map(next));
};

/** Films 300 grainy frames of 1920 by 1080, prepares the bench copy, measures both ways on it. */
export const measureCopy = async (gop: Gop): Promise<CopyMeasurement> => {
  const folder = await mkdtemp(join(tmpdir(), 'bench-video-'));
  const entry = fileURLToPath(new URL('page.ts', import.meta.url));
  const server = await startRangeServer(entry, folder);
  const browser = await browserType.launch(chromium);
  try {
    const copy = await prepareCopy(await filmSource('bench-1920', folder), gop);
    const { timeBase, ticks, width, height } = copy;
    const clip = { timeBase, ticks, width, height, url: `/clips/${relative(folder, copy.path)}` };
    const page = await browser.newPage();
    await page.goto(server.origin);

    await page.evaluate((c) => window.bench.open(c, null), clip);
    const steps = await inTurns(
      page,
      span(0, ROUNDS).map((round) => span(10 + 50 * round, STEPS_PER_ROUND)),
      async (frames) => {
        await page.evaluate(
          ([first = 0, ...rest]) => window.bench.settle(first - 1, rest.length + 2),
          frames,
        );
        return page.evaluate((f) => window.bench.ours(f, 'step'), frames);
      },
    );

    await page.evaluate((c) => window.bench.open(c, 1), clip);
    const jumps = await inTurns(page, jumpRounds(ticks.length), (frames) =>
      page.evaluate((f) => window.bench.ours(f, 'scrub'), frames),
    );
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
