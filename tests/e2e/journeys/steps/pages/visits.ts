import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from '../page-of-product.ts';
import { COACH } from '../people.ts';
import { clip, text } from './known-by.ts';

/** Visits and the Bench. */
export const VISITS: readonly PageOfProduct[] = [
  {
    name: 'a visit with everything',
    who: COACH,
    address: ({ quill }) => paths.visit(quill.visitId),
    stands: text('Open the Bench'),
  },
  {
    name: 'a visit with the safety check still to do',
    who: COACH,
    address: ({ beginner }) => paths.visit(beginner.visitId),
    stands: (page) => page.getByRole('button', { name: 'Record the safety check' }),
  },
  {
    name: 'a visit whose clips were refused',
    who: COACH,
    address: ({ refused }) => paths.visit(refused.visitId),
    stands: text('refused'),
  },
  {
    name: 'the call by eye',
    who: COACH,
    address: ({ brook }) => paths.call(brook.visitId, 'left'),
    stands: (page) => page.getByRole('button', { name: 'Save the call' }),
  },
  {
    name: 'the Bench',
    who: COACH,
    address: ({ quill }) => paths.bench(quill.clipId),
    stands: clip,
  },
  {
    name: 'the Bench with a box around the head',
    who: COACH,
    address: ({ quill }) => paths.bench(quill.clipId),
    stands: (page) => page.getByRole('button', { name: /^Box around the head/ }),
    then: async (page) => {
      await page.getByRole('button', { name: 'Head', exact: true }).click();
      await page.getByRole('button', { name: /^Put a box on frame/ }).click();
    },
  },
  {
    name: 'the Bench before the call by eye',
    who: COACH,
    address: ({ brook }) => `${paths.bench(brook.clipId)}?rep=4`,
    stands: clip,
  },
  {
    name: 'the Bench of a refused clip',
    who: COACH,
    address: ({ refused }) => paths.bench(refused.clipId),
    stands: text('This clip was refused'),
  },
];
