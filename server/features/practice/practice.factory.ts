import { randomUUID } from 'node:crypto';
import { type InPractice, product } from '../../db/in-practice.ts';
import { Practice } from './practice.entity.ts';

/** Makes an empty practice and gives its id. */
export const makePractice = async (
  inPractice: InPractice,
  given: { readonly id?: string; readonly name: string; readonly contact?: string },
): Promise<string> => {
  const { id = randomUUID(), name, contact = '' } = given;
  await inPractice(product(id), async ({ em }) => {
    em.create(Practice, { id, name, contact });
    await em.flush();
  });
  return id;
};
