import type { BenchEntry } from '../entry.ts';
import { comparePreparation } from '../server/preparation.ts';

const entry: BenchEntry = {
  name: 'preparing all copies of a 1080p clip of 5 s, against one bare encode of its bench copy',
  target: 1.6,
  run: () => comparePreparation('1920x1080', 5),
};

export default entry;
