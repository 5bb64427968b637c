import type { FramePhase, RepInput } from '#shared/course/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { LandmarkId, Mark, Marks, Side } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from '#shared/measures/inputs.ts';
import { CURRENT_ENGINE, type EngineVersion } from '#shared/reading/engine.ts';
import type { ReadingInput } from '#shared/reading/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { type ReadingRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { TrialError } from './trial-error.ts';
import {
  field,
  finite,
  list,
  object,
  optionalFinite,
  text,
  type TrialObject,
} from './trial-fields.ts';

/** Landmark sets of the trial files: product sets, and belt with the assumption. */
export const TRIAL_SETS = ['bare', 'belt', 'belt+prior', 'belt+thigh'] as const;
export type TrialSet = (typeof TRIAL_SETS)[number];

/** A trial file ready for the engine. */
export interface Trial {
  readonly id: string;
  readonly supportSide: Side;
  readonly reps: readonly RepInput[];
}

const SCHEMA = 'redshank-trial/1';

/** Names of the trial files, by the side stood on. */
const names = (side: Side): Readonly<Partial<Record<string, LandmarkId>>> => {
  const [L, R] =
    side === 'left' ? (['support', 'lifted'] as const) : (['lifted', 'support'] as const);
  return {
    asisL: `asis-${L}`,
    asisR: `asis-${R}`,
    outL: `outline-${L}`,
    outR: `outline-${R}`,
    acrL: `acromion-${L}`,
    acrR: `acromion-${R}`,
    kneeMedS: 'knee-inner',
    kneeLatS: 'knee-outer',
    patS: 'kneecap',
    kneeLift: 'lifted-knee',
    ankS: 'ankle-support',
    ankLift: 'ankle-lifted',
    toeS: 'toe-support',
    heelS: 'heel-support',
    tip: 'belt-tip',
    thTip: 'thigh-tip',
    thBaseA: 'strap-inner',
    thBaseB: 'strap-outer',
  };
};

const PHASES: Readonly<Partial<Record<string, FramePhase>>> = {
  quiet: 'quiet',
  rise: 'rise',
  lower: 'lower',
};

const marksOf = (value: TrialObject, side: Side, where: string): Marks => {
  const known = names(side);
  const marks: Partial<Record<LandmarkId, Mark>> = {};
  for (const [name, point] of Object.entries(value)) {
    const id = known[name];
    if (!id) throw new TrialError(`${where}: '${name}' is not a mark of ${SCHEMA}`);
    if (point === null) {
      marks[id] = { hidden: true };
      continue;
    }
    const place = `${where}.${name}`;
    const coordinates = list(point, place);
    if (coordinates.length !== 2) throw new TrialError(`${place} must be [u, v]`);
    marks[id] = {
      hidden: false,
      point: framePoint(finite(coordinates[0], place), finite(coordinates[1], place)),
      scale: 1,
      source: 'hand',
      looked: true,
    };
  }
  return marks;
};

const cameraOf = (trial: TrialObject): CameraInput => {
  const camera = object(field(trial, 'camera'), 'camera');
  const inputs = object(field(trial, 'app_inputs'), 'app_inputs');
  if (inputs.view !== undefined && inputs.view !== 'front')
    throw new TrialError(`app_inputs.view must be 'front'; the turn is read from front clips only`);
  return {
    view: 'front',
    width: finite(camera.width, 'camera.width'),
    height: finite(camera.height, 'camera.height'),
    mmPerPx: optionalFinite(inputs.mm_per_px, 'app_inputs.mm_per_px'),
    distanceMm: optionalFinite(inputs.D_mm, 'app_inputs.D_mm'),
    lensHeightMm: optionalFinite(inputs.lens_h_mm, 'app_inputs.lens_h_mm'),
    beltPointerMm: optionalFinite(inputs.tip_len_mm, 'app_inputs.tip_len_mm'),
    // counts from the femur axis in these files: nothing is added
    thighPointerMm: optionalFinite(inputs.th_len_mm, 'app_inputs.th_len_mm'),
    plumbTilt: null,
    framesPerSecond: optionalFinite(camera.fps, 'camera.fps'),
    mirrored: null,
    offFront: null,
    exposureMs: null,
    toes: null,
  };
};

const repOf = (value: unknown, at: number, side: Side, camera: CameraInput): RepInput => {
  const where = `reps[${at}]`;
  const frames = list(field(object(value, where), 'frames', where), `${where}.frames`);
  const labels: FramePhase[] = [];
  const inputs = frames.map((each, i) => {
    const place = `${where}.frames[${i}]`;
    const frame = object(each, place);
    const phase = PHASES[text(frame.phase, `${place}.phase`)];
    if (!phase) throw new TrialError(`${place}.phase must be 'quiet', 'rise' or 'lower'`);
    labels.push(phase);
    const index = finite(frame.frame, `${place}.frame`);
    if (!Number.isInteger(index) || index < 0)
      throw new TrialError(`${place}.frame must be a whole number from 0`);
    return {
      frame: frameIndex(index),
      time: milliseconds(finite(frame.t_ms, `${place}.t_ms`)),
      marks: marksOf(object(frame.marks, `${place}.marks`), side, `${place}.marks`),
    };
  });
  return {
    id: String(at),
    supportSide: side,
    camera,
    athlete: { bodyHeightMm: null },
    frames: inputs,
    sharedQuiet: null,
    moved: {},
    labels,
    excluded: null,
  };
};

/** Throws a TrialError that names the place and what must stand there. */
export const trialOf = (value: unknown): Trial => {
  const trial = object(value, 'the trial');
  if (trial.schema !== SCHEMA) throw new TrialError(`schema must be '${SCHEMA}'`);
  const stance = text(field(trial, 'stance'), 'stance');
  if (stance !== 'L' && stance !== 'R') throw new TrialError(`stance must be 'L' or 'R'`);
  const side: Side = stance === 'L' ? 'left' : 'right';
  const camera = cameraOf(trial);
  return {
    id: text(field(trial, 'id'), 'id'),
    supportSide: side,
    reps: list(field(trial, 'reps'), 'reps').map((rep, at) => repOf(rep, at, side, camera)),
  };
};

/** The engine's input for one landmark set of a trial. */
export const readingInputOf = (
  trial: Trial,
  set: TrialSet,
  engine: EngineVersion = CURRENT_ENGINE,
  rules: ReadingRules = STANDARD_RULES,
): ReadingInput => ({
  engine,
  supportSide: trial.supportSide,
  set: set === 'belt+prior' ? 'belt' : set,
  thighTurnsLittle: set === 'belt+prior',
  markError: ASSUMED_MARK_ERROR,
  ownSystematic: null,
  rules,
  reps: trial.reps,
});
