import { KINDS, type Mutant } from './mutants.ts';
import { explanationOf } from './survivors.ts';

export interface Tried {
  readonly mutant: Mutant;
  /** The test that found it; null: none did. */
  readonly by: string | null;
}

export const changeOf = ({ file, line, before, after, code }: Mutant): string =>
  `${file}:${line}  ${before} → ${after}  in  ${code}`;

export const unexplained = (tried: readonly Tried[]): readonly Mutant[] =>
  tried.flatMap(({ mutant, by }) => (by === null && !explanationOf(mutant) ? [mutant] : []));

/** Killed and survived by kind, then each survivor and why no test finds it. */
export const tally = (tried: readonly Tried[]): string => {
  const row = (name: string, of: readonly Tried[]): string => {
    const survived = of.filter(({ by }) => by === null);
    const open = unexplained(of).length;
    const counts = [of.length, of.length - survived.length, survived.length - open, open];
    return name.padEnd(12) + counts.map((count) => String(count).padStart(12)).join('');
  };
  const head = ['mutants', 'killed', 'explained', 'survived'].map((word) => word.padStart(12));
  const survivors = tried
    .filter(({ by }) => by === null)
    .map(({ mutant }) => `${changeOf(mutant)}\n    ${explanationOf(mutant) ?? 'NO TEST FINDS IT'}`);
  return [
    'kind'.padEnd(12) + head.join(''),
    ...KINDS.map((kind) =>
      row(
        kind,
        tried.filter(({ mutant }) => mutant.kind === kind),
      ),
    ),
    row('all', tried),
    '',
    ...survivors,
  ].join('\n');
};
