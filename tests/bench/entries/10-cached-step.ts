import type { BenchEntry } from '../entry.ts';
import { compare } from '../video/compare.ts';
import { measureCopyOnce } from '../video/measure.ts';

const entry: BenchEntry = {
  name: 'cached frame step, 1920 px, all intra, against the browser’s video',
  target: 0.1,
  async run() {
    const { steps, bytes } = await measureCopyOnce(1);
    return compare(steps, bytes);
  },
};

export default entry;
