import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { LockedPackage } from './locked-packages.ts';

const TEXT_FILE = /^(licen[sc]e|copying)([-.]\w+)*$/i;
const README = /^readme(\.(md|txt|markdown))?$/i;
/** Under its heading nothing but the licence's name. */
const IN_README = /^#+[ \t]*licen[sc]e[ \t]*\n+[ \t]*([\w.-]+)[ \t]*\n*$/im;
/** The words themselves, where nothing else names them: its heading, and the sentence that no other licence begins with. */
const MIT_WORDS =
  /^\s*(?:The )?MIT License\b[\s\S]*?\n\s*Permission is hereby granted, free of charge, to any person/;

interface Described {
  readonly license?: string | { readonly type: string };
  readonly licenses?: readonly { readonly type: string }[];
}

const filesOf = (folder: string, pattern: RegExp): string[] =>
  readdirSync(folder)
    .filter((name) => pattern.test(name))
    .sort();

const described = ({ license, licenses }: Described): string | undefined => {
  if (typeof license === 'string') return license;
  if (license) return license.type;
  return licenses?.map(({ type }) => type).join(' OR ');
};

/**
 * An SPDX expression: of the lock, else of the package's own description, else of its readme, else of the words it
 * brings. Null where none of them says.
 */
export const licenceOf = (root: string, one: LockedPackage): string | null => {
  const { entry, place, installed } = one;
  if (entry.license !== undefined) return entry.license;
  if (!installed) return null;
  const folder = join(root, place);
  const own = described(
    JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8')) as Described,
  );
  if (own !== undefined) return own;
  const [readme] = filesOf(folder, README);
  const text = readme === undefined ? '' : readFileSync(join(folder, readme), 'utf8');
  const named = IN_README.exec(text.replaceAll('\r\n', '\n'))?.[1];
  if (named !== undefined) return named;
  return MIT_WORDS.test(licenceTextOf(root, one) ?? '') ? 'MIT' : null;
};

/** The licence's words as the package brings them, or null. */
export const licenceTextOf = (root: string, { place }: LockedPackage): string | null => {
  const folder = join(root, place);
  const [name] = filesOf(folder, TEXT_FILE);
  return name === undefined ? null : readFileSync(join(folder, name), 'utf8');
};
