import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import { canonicalInputs } from '#shared/reading/canonical-inputs.ts';
import type { EngineVersion } from '#shared/reading/engine.ts';
import { sha256Hex } from '#shared/reading/sha256.ts';
import type { ReadingInput } from '#shared/reading/types.ts';
import { rulesOf } from '#shared/protocol/protocol.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Clip } from '../clips/clip.entity.ts';
import type { ProtocolVersion } from '../protocol/protocol-version.entity.ts';
import { repInput, timesOfClip } from '../reps/reps.presenter.ts';
import { type NumberedRep, storedReps } from '../reps/stored-reps.ts';

/** What a reading is made with beside its marks. */
export interface Grounds {
  readonly markError: MarkError;
  readonly protocol: ProtocolVersion;
  readonly engine: EngineVersion;
}

/** What a side's reading is derived from, with the rows that it came from. */
export interface SideInputs {
  readonly input: ReadingInput;
  /** SHA-256 of the canonical inputs, hex. */
  readonly hash: string;
  readonly reps: readonly NumberedRep[];
  readonly protocol: ProtocolVersion;
  /** Who placed the latest of its marks. */
  readonly markedBy: string;
}

/** Every marked rep of a visit, of both sides, clip by clip. */
export const markedReps = async (
  em: EntityManager,
  visitId: string,
  athlete: Athlete,
): Promise<NumberedRep[]> => {
  const clips = (await em.find(
    Clip,
    { visit: visitId, state: 'ready' },
    { populate: ['frames'], orderBy: { uploadedAt: 'asc', id: 'asc' } },
  )) as Clip[];
  return (await storedReps(em, clips, athlete)).filter(({ marks }) => marks.length > 0);
};

const latestHand = (reps: readonly NumberedRep[]): string | null => {
  const marks = reps.flatMap((stored) => stored.marks);
  const [first] = marks;
  return first
    ? marks.reduce((latest, mark) => (mark.at > latest.at ? mark : latest), first).byUser
    : null;
};

/** The inputs of one side; null where none of its reps carries a mark. */
export const sideInputs = (
  all: readonly NumberedRep[],
  side: Side,
  thighTurnsLittle: boolean,
  { markError, protocol, engine }: Grounds,
): SideInputs | null => {
  const reps = all.filter(({ rep }) => rep.supportSide === side);
  const markedBy = latestHand(reps);
  if (markedBy === null) return null;
  const input: ReadingInput = {
    engine,
    supportSide: side,
    set: null,
    thighTurnsLittle,
    markError,
    ownSystematic: null,
    rules: rulesOf(protocol.values),
    reps: reps.flatMap((stored) => repInput(stored, timesOfClip(stored.clip)) ?? []),
  };
  return { input, hash: sha256Hex(canonicalInputs(input)), reps, protocol, markedBy };
};
