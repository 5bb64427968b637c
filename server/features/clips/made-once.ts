/** So many pictures are made at the same time: each is a decoder of its own. */
const AT_ONCE = 2;

const waiting: (() => void)[] = [];
let running = 0;

const turn = (): Promise<void> => {
  if (running < AT_ONCE) {
    running += 1;
    return Promise.resolve();
  }
  return new Promise((resolve) => waiting.push(resolve));
};

const next = (): void => {
  const waiter = waiting.shift();
  if (waiter) waiter();
  else running -= 1;
};

const underWay = new Map<string, Promise<void>>();

/** Makes what lies under a key; whoever asks for it meanwhile waits for the same work. */
export const madeOnce = (key: string, make: () => Promise<void>): Promise<void> => {
  const known = underWay.get(key);
  if (known) return known;
  const work = turn()
    .then(make)
    .finally(() => {
      next();
      underWay.delete(key);
    });
  underWay.set(key, work);
  return work;
};
