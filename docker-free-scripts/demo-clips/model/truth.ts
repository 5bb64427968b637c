import type { TruthFile } from '#tests/fixtures/clips/truth.ts';
import { bodyOf, type ClipPlan, ROD_MM } from '../clips.ts';
import { type Angles, anglesOf } from './angles.ts';
import { type Camera, intoRoom, makeCamera, PICTURE } from './camera.ts';
import { FRONT_LANDMARKS, type LandmarkId, landmarksOf, SIDE_LANDMARKS } from './landmarks.ts';
import { type FrameFacts, phaseOf, repTruth } from './rep-truth.ts';
import type { Take } from './take.ts';
import type { Vec } from './vec.ts';

/** The rod stands beside the person in the plane of the ankles, across from the chair. */
export const rodY = (clip: ClipPlan): number => (clip.script.reps[0] === 'left' ? -600 : 600);

// adding nothing turns −0 into 0, which JSON cannot tell apart
const round = (value: number, digits: number): number => Number(value.toFixed(digits)) + 0;

/** Pixels of every landmark of the view, in the person's posture at `seconds`. */
export const marksAt = (
  take: Take,
  camera: Camera,
  seconds: number,
): ReadonlyMap<LandmarkId, readonly [number, number]> => {
  const place = intoRoom(take.clip.camera.facing);
  const wanted: readonly LandmarkId[] =
    take.clip.view === 'front' ? FRONT_LANDMARKS : SIDE_LANDMARKS;
  const landmarks = landmarksOf(take.skeletonAt(seconds), take.clip.pointers);
  return new Map(
    wanted.flatMap((id) => {
      const point = landmarks.get(id);
      return point === undefined ? [] : [[id, camera.project(place(point))] as const];
    }),
  );
};

const measure = (take: Take): readonly FrameFacts[] =>
  take.timesMs.map((ms) => {
    const bones = take.skeletonAt(ms / 1000);
    return {
      seconds: ms / 1000,
      rep: take.stanceAt(ms / 1000).rep,
      angles: anglesOf(bones),
      ankleHeight: bones.lifted.ankle[2] - bones.support.ankle[2],
    };
  });

const markColumns = (take: Take, camera: Camera): Record<string, number[]> => {
  const columns: Record<string, number[]> = {};
  for (const ms of take.timesMs)
    for (const [id, [u, v]] of marksAt(take, camera, ms / 1000))
      (columns[id] ??= []).push(round(u, 2), round(v, 2));
  return columns;
};

/** The clip's truth; `hidden` comes from the drawn pictures and is empty without them. */
export const clipTruth = (take: Take, hidden: TruthFile['frames']['hidden'] = {}): TruthFile => {
  const { clip } = take;
  const camera = makeCamera(clip.camera);
  const frames = measure(take);
  const reps = take.reps.map((plan, index) => repTruth(frames, index, plan));
  const column = (name: keyof Angles): number[] =>
    frames.map((frame) => round(frame.angles[name], 3));
  const rodEnd = (z: number): [number, number] => {
    const [u, v] = camera.project([0, rodY(clip), z] satisfies Vec);
    return [round(u, 2), round(v, 2)];
  };
  return {
    schema: 'redshank-demo-truth/1',
    clip: clip.name,
    file: clip.file,
    seed: clip.script.seed,
    picture: { ...PICTURE },
    view: clip.view,
    athlete: { body: clip.body, heightMm: bodyOf(clip).height },
    setUp: {
      mmPerPx: round(clip.camera.distance / clip.camera.focalPx, 5),
      distanceMm: clip.camera.distance,
      lensHeightMm: clip.camera.lensHeight,
      rodLengthMm: ROD_MM,
      beltPointerMm: clip.pointers.belt,
      thighPointerMm: clip.pointers.thigh,
    },
    camera: {
      focalPx: clip.camera.focalPx,
      panDeg: clip.camera.pan,
      tiltDeg: clip.camera.tilt,
      rollDeg: clip.camera.roll,
    },
    rod: { top: rodEnd(ROD_MM), bottom: rodEnd(0) },
    reps,
    frames: {
      tMs: take.timesMs.map((ms) => round(ms, 4)),
      rep: frames.map((frame) => frame.rep),
      phase: frames.map((frame, index) => {
        const rep = reps[frame.rep];
        return rep === undefined ? 'quiet' : phaseOf(index, rep);
      }),
      values: {
        lift: column('lift'),
        turn: column('turn'),
        yawFemur: column('yawFemur'),
        yawPelvis: column('yawPelvis'),
        obliquity: column('obliquity'),
        pelvisTilt: column('pelvisTilt'),
        trunkLean: column('trunkLean'),
        footTurnOut: column('footTurnOut'),
        liftToPelvis: column('liftToPelvis'),
      },
      marks: markColumns(take, camera),
      hidden,
    },
  };
};
