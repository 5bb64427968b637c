import { BODIES, type BodyName } from './model/bodies.ts';
import type { CameraPlan } from './model/camera.ts';
import type { Pointers } from './model/landmarks.ts';
import type { Script, Side } from './model/script.ts';
import { type Habits, USUAL_HABITS } from './model/stance.ts';
import type { TurnShapeName } from './model/turn-shapes.ts';

export type Container = 'phone-hevc' | 'h264' | 'vp9';

/** One demo clip: who is filmed, how, doing what, and the kind of file it becomes. */
export interface ClipPlan {
  readonly name: string;
  readonly file: string;
  readonly container: Container;
  /** H.264's constant rate factor; 23 where left out */
  readonly crf?: number;
  readonly fps: number;
  readonly body: BodyName;
  readonly view: 'front' | 'lifted-side';
  readonly camera: CameraPlan;
  readonly pointers: Pointers;
  /** False: none are worn */
  readonly stickers?: boolean;
  /** how the hip turns when this side supports */
  readonly shapes: Readonly<Record<Side, TurnShapeName>>;
  readonly habits: Habits;
  readonly script: Script;
  /** lift at which a picture is kept beside the clip, degrees */
  readonly posterLift: number | null;
}

const FRONT: CameraPlan = {
  focalPx: 1840,
  distance: 3000,
  lensHeight: 950,
  pan: 0,
  tilt: 0,
  roll: 0,
  facing: 0,
};

const THREE_RIGHT: Script = {
  seed: 11,
  reps: ['right', 'right', 'right'],
  top: 106,
  firstQuietS: 1.6,
  quietBetweenS: 1,
  slowness: 1,
};

export const ROD_MM = 1000;

export const CLIPS: readonly ClipPlan[] = [
  {
    name: 'right-early',
    file: 'right-early.mov',
    container: 'phone-hevc',
    fps: 60,
    body: 'woman',
    view: 'front',
    camera: { ...FRONT, pan: 0.6, tilt: -0.5, roll: 0.3 },
    pointers: { belt: 140, thigh: 125 },
    shapes: { left: 'early', right: 'early' },
    habits: USUAL_HABITS,
    posterLift: 80,
    script: THREE_RIGHT,
  },
  {
    name: 'left-expected',
    file: 'left-expected.mp4',
    container: 'h264',
    fps: 60,
    body: 'man',
    view: 'front',
    camera: { ...FRONT, focalPx: 1720, pan: -0.8, roll: -0.2 },
    pointers: { belt: 150, thigh: 140 },
    shapes: { left: 'expected', right: 'expected' },
    habits: { ...USUAL_HABITS, quietPelvisYaw: -1.2, footTurnOut: 12, hikeAt90: 4 },
    posterLift: null,
    script: { ...THREE_RIGHT, seed: 23, reps: ['left', 'left', 'left'], top: 109 },
  },
  {
    name: 'both-sides',
    file: 'both-sides.mp4',
    container: 'h264',
    fps: 30,
    body: 'child',
    view: 'front',
    camera: { ...FRONT, focalPx: 1800, distance: 2800, lensHeight: 880, pan: 0.3 },
    pointers: { belt: 125, thigh: 115 },
    shapes: { left: 'expected', right: 'early' },
    habits: { ...USUAL_HABITS, footTurnOut: 6, leanAt90: 4 },
    posterLift: null,
    script: {
      ...THREE_RIGHT,
      seed: 37,
      reps: ['right', 'left', 'right', 'left', 'right', 'left'],
      top: 112,
      quietBetweenS: 0.9,
      slowness: 0.9,
    },
  },
  {
    name: 'right-side',
    file: 'right-side.mp4',
    container: 'h264',
    crf: 27,
    fps: 30,
    body: 'woman',
    view: 'lifted-side',
    camera: { ...FRONT, facing: -90, pan: 0.2 },
    pointers: { belt: 140, thigh: 125 },
    shapes: { left: 'early', right: 'early' },
    habits: USUAL_HABITS,
    posterLift: null,
    // the same take as right-early, by a second phone
    script: THREE_RIGHT,
  },
  {
    name: 'bare-still',
    file: 'bare-still.webm',
    container: 'vp9',
    fps: 30,
    body: 'olderMan',
    view: 'front',
    camera: { ...FRONT, focalPx: 1780, tilt: 0.4 },
    pointers: { belt: null, thigh: null },
    shapes: { left: 'still', right: 'still' },
    habits: { ...USUAL_HABITS, quietPelvisYaw: 0.4, footTurnOut: 14, hikeAt90: 3 },
    posterLift: null,
    script: { ...THREE_RIGHT, seed: 53, top: 101 },
  },
  {
    name: 'short-lift',
    file: 'short-lift.mp4',
    container: 'h264',
    fps: 30,
    body: 'olderWoman',
    view: 'front',
    camera: { ...FRONT, focalPx: 1880, roll: 0.4 },
    pointers: { belt: 140, thigh: 120 },
    shapes: { left: 'still', right: 'still' },
    habits: { ...USUAL_HABITS, hikeAt90: 9, leanAt90: 6 },
    posterLift: null,
    script: { ...THREE_RIGHT, seed: 67, reps: ['left', 'left', 'left'], top: 75 },
  },
  {
    name: 'right-still',
    file: 'right-still.mp4',
    container: 'h264',
    crf: 28,
    fps: 30,
    body: 'tallWoman',
    view: 'front',
    camera: { ...FRONT, focalPx: 1760, pan: -0.4, tilt: -0.2, roll: 0.2 },
    pointers: { belt: 145, thigh: 130 },
    shapes: { left: 'still', right: 'still' },
    habits: { ...USUAL_HABITS, quietPelvisYaw: 0.3, footTurnOut: 10, hikeAt90: 4, leanAt90: 2 },
    posterLift: null,
    script: { ...THREE_RIGHT, seed: 71, reps: ['right', 'right'], top: 107 },
  },
];

export const bodyOf = (clip: ClipPlan): (typeof BODIES)[BodyName] => BODIES[clip.body];
