import { courseOfRep, isCourse, type RepCourse } from '#shared/course/course-of-rep.ts';
import { isTiedLift, liftFromSideRep } from '#shared/course/lift-from-side-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import type { TiedLift } from '#shared/measures/tied-lift.ts';
import type { TieFault } from '#shared/timing/shared-events.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { shownSet } from './shared-quiet.ts';

/** Why a rep does not take the lift of the side rep that a hand has named. */
export type RepTieFault =
  | TieFault
  /** Not a front and a lifted-side clip with reps of one support side. */
  | { readonly code: 'not-a-pair' };

/** A rep of a visit, and the rep of another clip of which a hand says that it is the same moment. */
export interface Tying {
  readonly input: RepInput | null;
  readonly clipId: string;
  readonly liftFrom: string | null;
  /** A clap that a hand has found in the clip, on the clip's clock. */
  readonly clap: Milliseconds | null;
}

/** True for a front rep and a lifted-side rep of another clip, standing on the same leg. */
export const canBePair = (
  front: Pick<Tying, 'input' | 'clipId'>,
  side: Pick<Tying, 'input' | 'clipId'>,
): boolean =>
  front.clipId !== side.clipId &&
  front.input?.camera.view === 'front' &&
  side.input?.camera.view === 'lifted-side' &&
  front.input.supportSide === side.input.supportSide;

/** Its course by its own marks. */
const ownCourse = (rep: RepInput): RepCourse | null => {
  if (rep.frames.length === 0) return null;
  const own = { ...rep, liftFrom: undefined };
  const course = courseOfRep(own, shownSet(own), ASSUMED_MARK_ERROR, { halfWidths: false });
  return isCourse(course) ? course : null;
};

/** Lift of the side rep that this one names, or why it is not taken; null where it names none. */
export const tieOf = (own: Tying, reps: readonly Tying[]): TiedLift | RepTieFault | null => {
  if (own.liftFrom === null) return null;
  const side = reps.find(({ input }) => input?.id === own.liftFrom);
  if (!own.input || !side?.input || !canBePair(own, side)) return { code: 'not-a-pair' };
  const front = ownCourse(own.input);
  const seen = ownCourse(side.input);
  if (!front || !seen) return { code: 'few-shared-events', have: [] };
  return liftFromSideRep({ course: front, clap: own.clap }, { course: seen, clap: side.clap });
};

/** The rep with the lift of the side rep that it names, or with the reason why it keeps its own. */
export const withTiedLift = <T extends Tying>(
  own: T,
  reps: readonly Tying[],
): T & { readonly tieFault: RepTieFault | null } => {
  const tie = tieOf(own, reps);
  if (!own.input || !tie) return { ...own, tieFault: null };
  return 'code' in tie || !isTiedLift(tie)
    ? { ...own, tieFault: tie }
    : { ...own, input: { ...own.input, liftFrom: tie }, tieFault: null };
};
