import type { Reading } from '#shared/contracts/readings.ts';
import { capital, decimal, degrees, inWords, turn } from '#src/ui/figures.ts';
import { gateRange } from '#src/ui/gate-words.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { changeRows } from '#shared/reading/changes.ts';
import { reasonWords } from '../words/reason-words.ts';
import { directionWords, meaningOf } from '../words/substitution-words.ts';

/** What speaks for the reading and what stands beside it, the deciding one first. */
export const reasonsOf = ({ result }: Reading): string[] => {
  const used = result.reps.filter(({ used }) => used);
  const reasons = [reasonWords(result.reason, result.rules)];
  const changes = used.flatMap(({ fit }) => (fit ? [fit.change.value] : []));
  if (changes.length > 1) {
    const same = changes.every((d) => d > 0) || changes.every((d) => d < 0);
    reasons.push(
      `The ${inWords(changes.length)} reps used ${same ? 'point the same way' : 'do not point the same way'}: ${changes.map((d) => turn(d)).join(', ')}.`,
    );
  }
  const tops = used.flatMap(({ fMax }) => fMax ?? []);
  const least = tops.length > 0 ? Math.min(...tops) : null;
  if (least !== null)
    reasons.push(
      least >= result.rules.gateTo
        ? `Every rep used reached ${degrees(least, 0)} or more, so the whole window from ${gateRange(gatesOf(result.rules))} was seen.`
        : `The lowest rep used reached ${degrees(least, 0)}: the end of the window is carried by the fit.`,
    );
  for (const row of changeRows(result)) {
    if (!row.beyond || row.change === null || row.smallest === null) continue;
    const size = (value: number) =>
      row.unit === 'degrees' ? degrees(Math.abs(value)) : `${decimal(Math.abs(value), 0)} mm`;
    const direction = directionWords(row.id, row.change);
    const meaning = meaningOf(row.id);
    reasons.push(
      `${capital(row.label)}${direction === '' ? '' : `, ${direction}`}: ${size(row.change)}, more than the ${size(row.smallest)} that can be told from none.${meaning === null ? '' : ` ${meaning}`}`,
    );
  }
  return reasons;
};
