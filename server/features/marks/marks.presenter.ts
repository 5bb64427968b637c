import type { MarkOutcome } from '#shared/contracts/reps.ts';
import type { Outcome } from './apply-commands.ts';
import { presentMark } from './mark-store.ts';

export const presentOutcome = ({ command, outcome, row }: Outcome): MarkOutcome => ({
  id: command.id,
  outcome,
  mark: row?.present ? presentMark(row) : null,
  revision: row?.revision ?? 0,
});
