import { createHash } from 'node:crypto';
import type { ShippedPackage } from '#shared/contracts/licences.ts';
import { browserImports } from './browser-imports.ts';
import { licenceOf, licenceTextOf } from './licence-of.ts';
import { isForProduction, lockedPackages, withAllTheyNeed } from './locked-packages.ts';

interface BuiltFile {
  /** From the folder of the pages. */
  readonly name: string;
  readonly text: string;
}

/** Every installed package that goes to browsers or runs on the server, by name. */
export const shippedPackages = (root: string) => {
  const locked = lockedPackages(root);
  const browser = withAllTheyNeed(locked, browserImports(root));
  const production = [...locked.values()].filter((one) => one.installed && isForProduction(one));
  return (
    [...new Set([...browser, ...production])]
      // what only the compiler reads goes nowhere
      .filter(({ name }) => !name.startsWith('@types/'))
      .map((one) => ({ one, browser: browser.has(one) }))
      .sort((a, b) => (a.one.name < b.one.name ? -1 : 1))
  );
};

/**
 * The list that the page of licences shows, and each licence's words once.
 * @throws Error where a package does not say its licence
 */
export const licenceFiles = (root: string): BuiltFile[] => {
  const texts = new Map<string, string>();
  const packages = shippedPackages(root).map(({ one, browser }): ShippedPackage => {
    const licence = licenceOf(root, one);
    if (licence === null) throw new Error(`${one.place} does not say its licence`);
    const text = licenceTextOf(root, one);
    const name = text && `licence-texts/${hashOf(text)}.txt`;
    if (name && text) texts.set(name, text);
    return { name: one.name, version: browser ? one.version : null, licence, browser, text: name };
  });
  return [
    { name: 'licences.json', text: JSON.stringify({ packages }) },
    ...[...texts].map(([name, text]) => ({ name, text })),
  ];
};

const hashOf = (text: string): string =>
  createHash('sha256').update(text).digest('hex').slice(0, 12);
