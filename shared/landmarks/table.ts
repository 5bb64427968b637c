import type { Landmark, LandmarkId, LandmarkSetId, Role, View } from './types.ts';
import { LANDMARK_IDS } from './types.ts';

const FRONT: readonly View[] = ['front'];
const FRONT_AND_BACK: readonly View[] = ['front', 'back'];
const ALL_VIEWS: readonly View[] = ['front', 'back', 'lifted-side', 'support-side'];
const SIDES: readonly View[] = ['lifted-side', 'support-side'];
const ALL_SETS: readonly LandmarkSetId[] = ['bare', 'belt', 'belt+thigh'];
const BARE: readonly LandmarkSetId[] = ['bare'];
const NO_THIGH_POINTER: readonly LandmarkSetId[] = ['bare', 'belt'];
const BELT: readonly LandmarkSetId[] = ['belt', 'belt+thigh'];
const THIGH: readonly LandmarkSetId[] = ['belt+thigh'];

const TABLE: Readonly<Record<LandmarkId, Omit<Landmark, 'id'>>> = {
  'asis-support': {
    label: 'Front corner of the hip bone, support side',
    where:
      'Follow the top of the hip bone forward to its front corner: a little inside and below the crest, where the bone ends under the finger.',
    role: 'support',
    errorClass: 'anatomical',
    sets: ALL_SETS,
    views: FRONT,
  },
  'asis-lifted': {
    label: 'Front corner of the hip bone, lifted side',
    where:
      'Follow the top of the hip bone forward to its front corner. When the thigh is high the groin crease lies just below it: if cloth or skin covers it, mark it hidden.',
    role: 'lifted',
    errorClass: 'anatomical',
    sets: ALL_SETS,
    views: FRONT,
  },
  'belt-tip': {
    label: 'Tip of the belt pointer',
    where: 'The far end of the stick that points straight forward from the belt.',
    role: 'midline',
    errorClass: 'pointer',
    sets: BELT,
    views: FRONT,
  },
  'outline-support': {
    label: 'Edge of the pelvis, support side',
    where: 'The outermost edge of the body at the height of the hip bone’s front corner.',
    role: 'support',
    errorClass: 'outline',
    sets: BARE,
    views: FRONT,
  },
  'outline-lifted': {
    label: 'Edge of the pelvis, lifted side',
    where: 'The outermost edge of the body at the height of the hip bone’s front corner.',
    role: 'lifted',
    errorClass: 'outline',
    sets: BARE,
    views: FRONT,
  },
  'lifted-knee': {
    label: 'Middle of the lifted knee',
    where:
      'The middle of the knee joint itself, halfway between its two edges. Not the knee-cap: on a level thigh that lies 3° too high.',
    role: 'lifted',
    errorClass: 'anatomical',
    sets: ALL_SETS,
    views: FRONT_AND_BACK,
  },
  kneecap: {
    label: 'Centre of the support knee-cap',
    where: 'The middle of the round bone at the front of the knee that is stood on.',
    role: 'support',
    errorClass: 'anatomical',
    sets: NO_THIGH_POINTER,
    views: FRONT,
  },
  'knee-inner': {
    label: 'Inner edge of the support knee',
    where: 'The edge of the knee towards the other leg, at the height of the knee-cap’s middle.',
    role: 'support',
    errorClass: 'anatomical',
    sets: NO_THIGH_POINTER,
    views: FRONT,
  },
  'knee-outer': {
    label: 'Outer edge of the support knee',
    where: 'The edge of the knee away from the other leg, at the height of the knee-cap’s middle.',
    role: 'support',
    errorClass: 'anatomical',
    sets: NO_THIGH_POINTER,
    views: FRONT,
  },
  'thigh-tip': {
    label: 'Tip of the thigh pointer',
    where: 'The far end of the stick on the strap just above the knee that is stood on.',
    role: 'support',
    errorClass: 'pointer',
    sets: THIGH,
    views: FRONT,
  },
  'strap-inner': {
    label: 'Inner end of the strap',
    where: 'Where the strap of the thigh pointer meets the inner edge of the thigh.',
    role: 'support',
    errorClass: 'pointer',
    sets: THIGH,
    views: FRONT,
  },
  'strap-outer': {
    label: 'Outer end of the strap',
    where: 'Where the strap of the thigh pointer meets the outer edge of the thigh.',
    role: 'support',
    errorClass: 'pointer',
    sets: THIGH,
    views: FRONT,
  },
  'ankle-support': {
    label: 'Middle of the support ankle',
    where: 'Halfway between the two ankle knobs of the leg that is stood on.',
    role: 'support',
    errorClass: 'anatomical',
    sets: ALL_SETS,
    views: ALL_VIEWS,
  },
  'ankle-lifted': {
    label: 'Middle of the lifted ankle',
    where: 'Halfway between the two ankle knobs of the leg that is raised.',
    role: 'lifted',
    errorClass: 'anatomical',
    sets: ALL_SETS,
    views: ALL_VIEWS,
  },
  'acromion-support': {
    label: 'Shoulder corner, support side',
    where: 'The bony corner on top of the shoulder, at its outer end.',
    role: 'support',
    errorClass: 'anatomical',
    sets: [],
    views: FRONT_AND_BACK,
  },
  'acromion-lifted': {
    label: 'Shoulder corner, lifted side',
    where: 'The bony corner on top of the shoulder, at its outer end.',
    role: 'lifted',
    errorClass: 'anatomical',
    sets: [],
    views: FRONT_AND_BACK,
  },
  'toe-support': {
    label: 'Toe of the support foot',
    where: 'The end of the second toe of the foot that is stood on.',
    role: 'support',
    errorClass: 'anatomical',
    sets: [],
    views: FRONT_AND_BACK,
  },
  'heel-support': {
    label: 'Heel of the support foot',
    where: 'The lowest point of the heel that is stood on, as far as it can be seen.',
    role: 'support',
    errorClass: 'anatomical',
    sets: [],
    views: FRONT_AND_BACK,
  },
  trochanter: {
    label: 'Hip knob',
    where:
      'The bony knob at the outside of the hip: it moves under the finger when the leg is turned in and out.',
    role: 'seen',
    errorClass: 'anatomical',
    sets: [],
    views: SIDES,
  },
  'knee-lateral': {
    label: 'Outside of the knee joint',
    where: 'The middle of the knee’s outer face, level with the joint line.',
    role: 'seen',
    errorClass: 'anatomical',
    sets: [],
    views: SIDES,
  },
  acromion: {
    label: 'Shoulder corner',
    where: 'The bony corner on top of the shoulder, at its outer end.',
    role: 'seen',
    errorClass: 'anatomical',
    sets: [],
    views: SIDES,
  },
  asis: {
    label: 'Front corner of the hip bone',
    where: 'Follow the top of the hip bone forward to its front corner.',
    role: 'seen',
    errorClass: 'anatomical',
    sets: [],
    views: ['support-side'],
  },
  psis: {
    label: 'Back corner of the hip bone',
    where:
      'Follow the top of the hip bone backward to its end: a small hollow lies over it on many people.',
    role: 'seen',
    errorClass: 'anatomical',
    sets: [],
    views: ['support-side'],
  },
};

/** All landmarks in the order in which marking is led: from the pelvis down, each side in turn. */
export const LANDMARKS: readonly Landmark[] = LANDMARK_IDS.map((id) => ({ id, ...TABLE[id] }));

export const landmark = (id: LandmarkId): Landmark => ({ id, ...TABLE[id] });

/** Landmarks a set needs on every frame, in the order of marking: 10 bare, 9 and 9 with pointers. */
export const landmarksOf = (set: LandmarkSetId): readonly LandmarkId[] =>
  LANDMARKS.filter((each) => each.sets.includes(set)).map((each) => each.id);

/** Landmarks that can be marked in a view, in the order of marking. */
export const landmarksIn = (view: View): readonly LandmarkId[] =>
  LANDMARKS.filter((each) => each.views.includes(view)).map((each) => each.id);

/** Whose shape a landmark is drawn with: in a side clip the leg the camera sees decides. */
export const roleIn = (id: LandmarkId, view: View): Exclude<Role, 'seen'> => {
  const { role } = TABLE[id];
  if (role !== 'seen') return role;
  return view === 'lifted-side' ? 'lifted' : 'support';
};
