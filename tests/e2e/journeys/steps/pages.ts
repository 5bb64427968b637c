import { CODES } from './code-pages.ts';
import type { PageOfProduct } from './page-of-product.ts';
import { ATHLETES } from './pages/athletes.ts';
import { FRONT } from './pages/front.ts';
import { PRACTICE } from './pages/practice.ts';
import { READINGS } from './pages/readings.ts';
import { REPLAYS } from './pages/replays.ts';
import { VISITS } from './pages/visits.ts';

/** Every page of the product, in the order of the job. */
export const PAGES: readonly PageOfProduct[] = [
  ...FRONT,
  ...CODES,
  ...PRACTICE,
  ...ATHLETES,
  ...VISITS,
  ...READINGS,
  ...REPLAYS,
];
