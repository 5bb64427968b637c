import type { BenchEntry } from '../entry.ts';
import { median, quantile } from '../median.ts';
import { onTrackingPage } from '../tracking/measure.ts';

const entry: BenchEntry = {
  name: 'following 12 marks on a frame, 1080 × 1920, against decoding it',
  target: 1,
  run: () =>
    onTrackingPage(async (page, { points, ...clip }) => {
      const { decoding, following } = await page.evaluate(
        ([c, p, n]) => window.trackingBench.costs(c, p, n),
        [clip, points, clip.ticks.length - 1] as const,
      );
      const [a, b] = [median(following), median(decoding)];
      return {
        ...{ ratio: a / b, a, b },
        info: {
          unit: 'ms',
          points: points.length,
          frames: following.length,
          'p95 following': quantile(following, 0.95),
          'p95 decoding': quantile(decoding, 0.95),
        },
      };
    }),
};

export default entry;
