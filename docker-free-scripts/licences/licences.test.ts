import { describe, expect, it } from 'vitest';
import { licenceList } from '#shared/contracts/licences.ts';
import { browserImports } from './browser-imports.ts';
import { licenceFiles, shippedPackages } from './licence-files.ts';
import { licenceOf } from './licence-of.ts';
import { isForProduction, lockedPackages, withAllTheyNeed } from './locked-packages.ts';

const ROOT = '.';

/** Looked through by a person: none asks for the sources of what stands beside it. */
const ALLOWED: ReadonlySet<string> = new Set([
  '0BSD',
  'Apache-2.0',
  'BSD-2-Clause',
  'BSD-3-Clause',
  'BlueOak-1.0.0',
  'CC0-1.0',
  'ISC',
  'MIT',
  'MIT-0',
  // its own files alone, which are shipped unchanged
  'MPL-2.0',
  // fonts
  'OFL-1.1',
]);
/** One of several to choose from is enough; of several that all hold each has to be. */
const isAllowed = (licence: string): boolean =>
  licence
    .replaceAll(/[()]/g, '')
    .split(' OR ')
    .some((choice) => choice.split(' AND ').every((each) => ALLOWED.has(each)));

describe('licences', () => {
  it('of everything that is shipped, on any system, are ones that the product may use', () => {
    const locked = [...lockedPackages(ROOT).values()].filter(isForProduction);
    expect(locked.length).toBeGreaterThan(300);
    const shipped = shippedPackages(ROOT).map(({ one }) => one);
    const others = [...new Set([...locked, ...shipped])]
      .map((one) => ({ place: one.place, licence: licenceOf(ROOT, one) }))
      .filter(({ licence }) => licence === null || !isAllowed(licence));
    expect(others).toEqual([]);
  });

  it('are not taken for allowed by a part of their name or of a choice', () => {
    expect(isAllowed('(MIT OR GPL-3.0)')).toBe(true);
    for (const licence of ['GPL-3.0', 'AGPL-3.0-only', 'MIT AND GPL-3.0', 'UNLICENSED', 'mit', ''])
      expect(isAllowed(licence), licence).toBe(false);
  });

  it('stand in the list with their words, for browsers with their versions', () => {
    const [list, ...texts] = licenceFiles(ROOT);
    expect(list?.name).toBe('licences.json');
    const { packages } = licenceList.parse(JSON.parse(list?.text ?? ''));
    const by = (name: string) => packages.find((one) => one.name === name);
    expect(by('react')).toMatchObject({
      licence: 'MIT',
      browser: true,
      version: expect.stringMatching(/^19\./) as string,
    });
    expect(by('scheduler')).toMatchObject({ browser: true });
    expect(by('express')).toMatchObject({ licence: 'MIT', browser: false, version: null });
    // says it by its words alone
    expect(by('png-js')).toMatchObject({ licence: 'MIT', browser: false });
    expect(by('vitest')).toBeUndefined();
    const font = by('@fontsource/source-sans-3');
    expect(font).toMatchObject({ licence: 'OFL-1.1', browser: true });
    expect(texts.find(({ name }) => name === font?.text)?.text).toContain(
      'SIL OPEN FONT LICENSE Version 1.1',
    );
    const named = packages.flatMap(({ text }) => text ?? []);
    expect(new Set(named)).toEqual(new Set(texts.map(({ name }) => name)));
    // these two name their licence and bring no words of it
    expect(
      packages.filter(({ browser, text }) => browser && text === null).map(({ name }) => name),
    ).toEqual(['combine-errors', 'custom-error-instance']);
    expect(new Set(packages.map(({ name, version }) => `${name} ${version}`)).size).toBeGreaterThan(
      300,
    );
  });

  it('are those of what the pages import, and of what that needs in its own place', () => {
    const names = browserImports(ROOT);
    for (const name of ['react', 'mediabunny', 'tailwindcss', '@tanstack/react-query'])
      expect(names).toContain(name);
    for (const name of ['express', 'vitest', 'node:fs']) expect(names).not.toContain(name);
    const locked = lockedPackages(ROOT);
    const places = [...withAllTheyNeed(locked, ['umzug'])].map(({ place }) => place);
    expect(places).toContain('node_modules/umzug/node_modules/type-fest');
    expect(places).not.toContain('node_modules/type-fest');
  });
});
