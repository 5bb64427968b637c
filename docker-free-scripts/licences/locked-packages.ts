import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** One place of package-lock.json, such as node_modules/express. */
interface Entry {
  readonly version?: string;
  readonly license?: string;
  readonly dev?: boolean;
  readonly dependencies?: Record<string, string>;
  readonly optionalDependencies?: Record<string, string>;
  readonly peerDependencies?: Record<string, string>;
}

export interface LockedPackage {
  /** Its folder, from the root of the repository. */
  readonly place: string;
  readonly name: string;
  readonly version: string;
  readonly entry: Entry;
  /** Whether it is on this machine: what is for another system is not. */
  readonly installed: boolean;
}

const ROOMS = 'node_modules/';

/** Every package of the lock, by its place. */
export const lockedPackages = (root: string): Map<string, LockedPackage> => {
  const { packages } = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')) as {
    packages: Record<string, Entry>;
  };
  return new Map(
    Object.entries(packages)
      .filter(([place]) => place !== '')
      .map(([place, entry]) => [
        place,
        {
          place,
          name: place.slice(place.lastIndexOf(ROOMS) + ROOMS.length),
          version: entry.version ?? '',
          entry,
          installed: existsSync(join(root, place, 'package.json')),
        },
      ]),
  );
};

/** What `npm ci --omit=dev` would bring, on some system. */
export const isForProduction = ({ entry }: LockedPackage): boolean => entry.dev !== true;

/** The package that a name means, seen from a place: the nearest folder outwards that has it. */
const seenFrom = (
  locked: ReadonlyMap<string, LockedPackage>,
  place: string,
  name: string,
): LockedPackage | undefined => {
  for (let at = place; ; at = at.slice(0, Math.max(at.lastIndexOf(`/${ROOMS}`), 0))) {
    const found = locked.get(at === '' ? `${ROOMS}${name}` : `${at}/${ROOMS}${name}`);
    if (found || at === '') return found;
  }
};

/** The packages of these names and all that they need, as far as they are installed. */
export const withAllTheyNeed = (
  locked: ReadonlyMap<string, LockedPackage>,
  names: Iterable<string>,
): Set<LockedPackage> => {
  const reached = new Set<LockedPackage>();
  const go = (place: string, name: string): void => {
    const found = seenFrom(locked, place, name);
    if (!found?.installed || reached.has(found)) return;
    reached.add(found);
    const { dependencies, optionalDependencies, peerDependencies } = found.entry;
    for (const next of Object.keys({
      ...dependencies,
      ...optionalDependencies,
      ...peerDependencies,
    }))
      go(found.place, next);
  };
  for (const name of names) go('', name);
  return reached;
};
