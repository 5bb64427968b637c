import type { EntityManager } from '@mikro-orm/postgresql';
import type { Cell } from '#shared/exports/frame-rows.ts';
import { FRAME_COLUMNS, frameRows } from '#shared/exports/frame-rows.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import type { Side } from '#shared/landmarks/types.ts';
import { Problem } from '../../http/problem.ts';
import { Call } from '../calls/call.entity.ts';
import { shownSet } from '#shared/records/shared-quiet.ts';
import { repInput, timesOfClip } from '../reps/reps.presenter.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import { csvText } from './csv.ts';

/** Figures are shown only after somebody has said what they saw: in a file as on a page. */
export const needCalled = async (
  em: EntityManager,
  visitId: string,
  sides: ReadonlySet<Side>,
): Promise<void> => {
  const calls = await em.find(Call, { visit: visitId }, { fields: ['side'] });
  const called = new Set(calls.map(({ side }) => side));
  if ([...sides].some((side) => !called.has(side))) throw new Problem('call-first');
};

const rowsOf = (stored: NumberedRep, visitDay: string): Cell[][] => {
  const input = repInput(stored, timesOfClip(stored.clip));
  if (!input) return [];
  return frameRows({
    input,
    set: shownSet(input),
    markError: ASSUMED_MARK_ERROR,
    visitDay,
    clip: stored.clip.name,
    number: stored.number,
  });
};

/** The marked frames of some reps as one table. */
export const framesCsv = (reps: readonly NumberedRep[], visitDay: string): string =>
  csvText(
    FRAME_COLUMNS,
    reps.flatMap((stored) => rowsOf(stored, visitDay)),
  );
