/** What the cache keeps: anything that knows the memory it takes. */
export interface Held {
  readonly bytes: number;
}

/**
 * Keeps things by whole-number place within a budget of bytes. When the budget is passed, what
 * lies farthest from the playhead goes first, be it the newcomer; of two equally far, the one
 * behind. Evicted items are only forgotten: whoever still shows one keeps it valid, and the
 * garbage collector takes the rest.
 */
export class FarthestCache<T extends Held> {
  readonly budgetBytes: number;
  #held = new Map<number, T>();
  #bytes = 0;
  #playhead = 0;

  constructor(budgetBytes: number) {
    this.budgetBytes = budgetBytes;
  }

  get bytes(): number {
    return this.#bytes;
  }

  get size(): number {
    return this.#held.size;
  }

  has(place: number): boolean {
    return this.#held.has(place);
  }

  get(place: number): T | undefined {
    return this.#held.get(place);
  }

  movePlayhead(place: number): void {
    this.#playhead = place;
  }

  put(place: number, item: T): void {
    this.#drop(place);
    this.#held.set(place, item);
    this.#bytes += item.bytes;
    while (this.#bytes > this.budgetBytes) this.#drop(this.#farthest());
  }

  clear(): void {
    this.#held.clear();
    this.#bytes = 0;
  }

  #drop(place: number): void {
    const item = this.#held.get(place);
    if (!item) return;
    this.#held.delete(place);
    this.#bytes -= item.bytes;
  }

  #farthest(): number {
    let worst = this.#playhead;
    let worstDistance = -1;
    for (const place of this.#held.keys()) {
      const distance = Math.abs(place - this.#playhead);
      if (distance > worstDistance || (distance === worstDistance && place < worst)) {
        worst = place;
        worstDistance = distance;
      }
    }
    return worst;
  }
}
