import { type EntityManager, ref } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { deriveApart } from './derive-apart.ts';
import { Reading } from './reading.entity.ts';
import type { SideInputs } from './side-inputs.ts';
import { DEFAULT_ASSUMPTION } from './default-assumption.ts';
import { SideSetting } from './side-setting.entity.ts';

/** What is kept of a side; made when first asked for. */
export const sideSetting = async (
  em: EntityManager,
  visitId: string,
  side: Side,
): Promise<SideSetting> => {
  await em.execute(
    `insert into side_setting (id, practice_id, visit_id, side, assumption)
      values (gen_random_uuid(), current_practice(), ?, ?, ${DEFAULT_ASSUMPTION}) on conflict (visit_id, side) do nothing`,
    [visitId, side],
  );
  return em.findOneOrFail(
    SideSetting,
    { visit: visitId, side },
    { populate: ['reading.result', 'reading.protocol'] },
  );
};

/** Columns of a new reading, from what the engine said. */
export const columnsOf = (
  result: ReadingResult,
  { anatomicalPx, doublyMarkedFrames }: MarkError,
) => ({
  markErrorPx: anatomicalPx,
  doublyMarkedFrames,
  engine: result.engine,
  inputHash: result.inputHash,
  seed: Number.parseInt(result.inputHash.slice(0, 8), 16),
  code: result.code,
  before60: result.before60,
  change: result.figures?.d ?? null,
  u: result.figures?.uC ?? null,
  pEarly: result.figures?.pEarly ?? null,
  smallestFound: result.figures?.mdt90 ?? null,
  provisional: result.provisional,
  assumption: result.thighTurnsLittle,
  gateFrom: result.rules.gateFrom,
  gateTo: result.rules.gateTo,
});

const stored = (
  em: EntityManager,
  visitId: string,
  side: Side,
  inputHash: string,
): Promise<Reading | null> =>
  em.findOne(
    Reading,
    { visit: visitId, side, inputHash },
    { populate: ['result', 'by', 'protocol'] },
  );

/** The reading that these inputs gave before, if they did. */
export const knownReading = async (
  em: EntityManager,
  setting: SideSetting,
  { hash }: SideInputs,
): Promise<Reading | null> => {
  const known = await stored(em, setting.visit.id, setting.side, hash);
  if (known) setting.reading = ref(known);
  return known;
};

/** Keeps a new reading. Two who derive the same at once keep one: the second finds the first one's row. */
export const keepReading = async (
  em: EntityManager,
  setting: SideSetting,
  inputs: SideInputs,
  result: ReadingResult,
): Promise<Reading> => {
  const visitId = setting.visit.id;
  await em.execute(
    `insert into reading (id, practice_id, visit_id, side, engine, input_hash, seed, inputs, result, code, before60,
        change, u, p_early, smallest_found, provisional, assumption, mark_error_px, doubly_marked_frames,
        gate_from, gate_to, protocol_id, by_id, at)
      select gen_random_uuid(), current_practice(), ?, ?, r.engine, r."inputHash", r.seed, ?::jsonb, ?::jsonb, r.code,
        r.before60, r.change, r.u, r."pEarly", r."smallestFound", r.provisional, r.assumption,
        r."markErrorPx", r."doublyMarkedFrames", r."gateFrom", r."gateTo", ?, ?, now()
      from jsonb_to_record(?::jsonb) as r (engine int, "inputHash" text, seed bigint, code text, before60 boolean,
        change double precision, u double precision, "pEarly" double precision, "smallestFound" double precision,
        provisional boolean, assumption boolean, "markErrorPx" double precision, "doublyMarkedFrames" int,
        "gateFrom" double precision, "gateTo" double precision)
      on conflict (visit_id, side, input_hash) do nothing`,
    [
      visitId,
      setting.side,
      JSON.stringify(inputs.input),
      JSON.stringify(result),
      inputs.protocol.id,
      inputs.markedBy,
      JSON.stringify(columnsOf(result, inputs.input.markError)),
    ],
  );
  const made = await knownReading(em, setting, inputs);
  if (!made) throw new Error('A reading was written and is not there.');
  return made;
};

/**
 * The reading of the marks as they stand. The same inputs find the row again; other inputs make another, and the
 * old one stays as it was made.
 */
export const currentReading = async (
  em: EntityManager,
  setting: SideSetting,
  inputs: SideInputs,
): Promise<Reading> =>
  (await knownReading(em, setting, inputs)) ??
  keepReading(em, setting, inputs, await deriveApart(inputs.input));
