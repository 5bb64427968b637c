import type { Count, Power, SetTables, Tenth } from './tables.ts';

const share = ({ hits, of }: Count): string =>
  of === 0 ? '–' : `${((100 * hits) / of).toFixed(1)} % (${hits} of ${of})`;

const power = (all: readonly Power[], reps: number): string => {
  const these = all.filter((each) => each.reps === reps);
  const width = these.reduce((sum, each) => sum + (each.smallestChange ?? NaN), 0) / these.length;
  const found = these.map(({ size, found: { hits, of } }) =>
    of === 0 ? `${size}° –` : `${size}° ${Math.round((100 * hits) / of)} %`,
  );
  const rep = reps === 1 ? '1 rep ' : `${reps} reps`;
  return `  ${rep}: ${found.join(' · ')} · 1.96 u at no turn ${width.toFixed(1)}°`;
};

const LEAST_IN_TENTH = 50;

const tenths = (all: readonly Tenth[]): string =>
  all
    .filter((tenth) => tenth.true.of > 0)
    .map(({ from, stated, true: { hits, of } }) => {
      const thin = of < LEAST_IN_TENTH ? ' (few)' : '';
      return `    ${from.toFixed(1)}–${(from + 0.1).toFixed(1)}: stated ${(100 * stated).toFixed(0)} %, true ${((100 * hits) / of).toFixed(0)} % of ${of}${thin}`;
    })
    .join('\n');

/** One landmark set's figures as lines of text. */
export const wordsOf = (tables: SetTables): string =>
  [
    tables.set,
    `  early calls at no turn: ${share(tables.falseEarly.assumed)} as assumed, ${share(tables.falseEarly.harder)} with drifting marks or twice the artefact`,
    `  early calls at an expected turn: ${share(tables.wrongWay)}; expected turn found: ${share(tables.expectedFound)}`,
    `  cannot tell: ${share(tables.cannotTell)}; not measurable: ${share(tables.notMeasurable)}`,
    `  early turn found, 1,080 lines marked to 3 px:`,
    power(tables.power, 1),
    power(tables.power, 3),
    `  error against the stated uncertainty: ${tables.spread.assumed.toFixed(2)} as assumed, ${tables.spread.harder.toFixed(2)} harder`,
    `  probability of an early turn, as assumed:`,
    tenths(tables.calibration.assumed),
    `  the same, harder:`,
    tenths(tables.calibration.harder),
  ].join('\n');
