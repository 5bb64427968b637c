import type { BenchEntry } from '../entry.ts';
import { median, quantile } from '../median.ts';
import { onTrackingPage } from '../tracking/measure.ts';

const TURNS = 5;
const STEPS = 40;

const entry: BenchEntry = {
  name: 'cached frame step while marks are followed, p95, against nobody following',
  target: 1.5,
  run: () =>
    onTrackingPage(async (page, { points, ...clip }) => {
      const { alone, followed } = await page.evaluate(
        ([c, p, turns, steps]) => window.trackingBench.steps(c, p, turns, steps),
        [clip, points, TURNS, STEPS] as const,
      );
      const [a, b] = [quantile(followed, 0.95) ?? NaN, quantile(alone, 0.95) ?? NaN];
      return {
        ...{ ratio: a / b, a, b },
        info: {
          unit: 'ms',
          steps: followed.length,
          'median while following': median(followed),
          'median alone': median(alone),
        },
      };
    }),
};

export default entry;
