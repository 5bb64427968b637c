import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FarthestCache } from './farthest-cache.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const filled = (budget: number, playhead: number, places: readonly number[]) => {
  const cache = new FarthestCache<{ bytes: number }>(budget);
  cache.movePlayhead(playhead);
  for (const place of places) cache.put(place, { bytes: 10 });
  return { cache, held: () => places.filter((place) => cache.has(place)) };
};

describe('FarthestCache', () => {
  it('lets go of what lies farthest from the playhead', () => {
    expect(filled(30, 5, [1, 4, 5, 6]).held()).toEqual([4, 5, 6]);
  });

  it('does not keep a newcomer that is itself the farthest', () => {
    expect(filled(30, 5, [4, 5, 6, 9]).held()).toEqual([4, 5, 6]);
  });

  it('lets go of the one behind when two are equally far', () => {
    expect(filled(20, 5, [4, 5, 6]).held()).toEqual([5, 6]);
  });

  it('counts an item put twice once', () => {
    const { cache } = filled(100, 0, [3, 3]);
    expect([cache.size, cache.bytes]).toEqual([1, 10]);
  });

  it('keeps nothing that is larger than the budget', () => {
    expect(filled(5, 0, [0]).held()).toEqual([]);
  });

  it('forgets everything at once', () => {
    const { cache } = filled(100, 0, [1, 2]);
    cache.clear();
    expect([cache.size, cache.bytes, cache.get(1)]).toEqual([0, 0, undefined]);
  });

  it('never passes its budget and counts what it holds', () => {
    const puts = fc.array(
      fc.record({ place: fc.nat(50), bytes: fc.integer({ min: 1, max: 40 }), head: fc.nat(50) }),
    );
    fc.assert(
      fc.property(puts, (list) => {
        const cache = new FarthestCache<{ bytes: number }>(100);
        for (const { place, bytes, head } of list) {
          cache.movePlayhead(head);
          cache.put(place, { bytes });
          expect(cache.bytes).toBeLessThanOrEqual(100);
        }
        const places = Array.from({ length: 51 }, (_, place) => cache.get(place)?.bytes ?? 0);
        expect(cache.bytes).toBe(places.reduce((sum, bytes) => sum + bytes, 0));
      }),
    );
  });
});
