import { inHundred } from '#shared/protocol/bounds.ts';
import { levelWords } from '#shared/exports/running-text.ts';
import { type Gates, sameGates, STANDARD_GATES } from '#shared/protocol/protocol.ts';

export { levelWords };

/** `60° to 90°` */
export const gateRange = ({ from, to }: Gates): string => `${from}° to ${to}°`;

/** `from 55° to 90°`; without figures while the practice's gates are not known. */
export const betweenGates = (gates: Gates | null): string =>
  gates ? `from ${gateRange(gates)}` : 'from gate to gate';

/** Said beside a figure of the study where a practice has other gates than it was taken with; else nothing. */
export const studiedBetween = (gates: Gates | null): string =>
  gates && !sameGates(gates, STANDARD_GATES) ? `, worked out for ${gateRange(STANDARD_GATES)}` : '';

/** `95`, `97.5`: of a probability from 0 to 1. */
export const outOfHundred = (limit: number): string => `${inHundred(limit)}`;

/** `rose from 60° to level`: what the eye is asked to judge. */
export const roseWords = ({ from, to }: Gates): string => `rose from ${from}° to ${levelWords(to)}`;
