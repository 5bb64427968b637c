import type { BenchEntry } from '../entry.ts';
import { compare } from '../video/compare.ts';
import { measureCopyOnce } from '../video/measure.ts';

const entry: BenchEntry = {
  name: 'cold jump, 1920 px, all intra, against the browser’s video',
  target: 0.35,
  async run() {
    const { jumps, bytes } = await measureCopyOnce(1);
    return compare(jumps, bytes);
  },
};

export default entry;
