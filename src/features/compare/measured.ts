import type { SidePage } from '#shared/contracts/readings.ts';
import { shortDay } from '#src/ui/days.ts';
import type { End, PlayableRep } from './ends.ts';

/** One end with all that is compared of it. */
export interface Measured {
  readonly end: End;
  readonly page: SidePage;
  readonly reading: NonNullable<SidePage['reading']>;
  readonly rep: PlayableRep;
}

/** `standing on the right, 3 March, rep 2` */
export const nameOf = ({ end, page, rep }: Measured): string =>
  `standing on the ${end.side}, ${shortDay(page.visit.day)}, rep ${rep.number}`;
