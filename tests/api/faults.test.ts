import { afterAll, beforeAll, describe, it } from 'vitest';
import { type Instance, startInstance } from '#tests/faults/instance.ts';
import { openPlace, type Place } from '#tests/faults/place.ts';
import { runOne, saidOf } from '#tests/faults/run.ts';

/** Of what `npm run faults` does, one of each kind of work; every part is killed in some. */
const SEEDS = [2, 3, 5, 7, 8, 10];

const PATIENT = 240_000;
let instance: Instance;
let place: Place;
beforeAll(async () => {
  instance = await startInstance();
  place = await openPlace(instance);
}, PATIENT);
afterAll(async () => {
  await place?.close();
  await instance?.close();
}, PATIENT);

describe('a part that is killed loses nothing and leaves nothing half made', () => {
  it.each(SEEDS.map((seed) => [saidOf(seed), seed] as const))(
    '%s',
    (_, seed) => runOne(place, seed),
    PATIENT,
  );
});
