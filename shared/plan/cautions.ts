/** Questions of the safety check before filming whose answer matters to an exercise. */
export const SAFETY_ANSWERS = [
  'pain-today',
  'hip-replacement-or-limits',
  'weight-bearing-limits',
  'recent-surgery-or-fracture',
  'falls-or-poor-balance',
  'vertigo-or-dizziness',
  'nerve-symptoms',
  'confidential-any',
] as const;
export type SafetyAnswer = (typeof SAFETY_ANSWERS)[number];

/** Said with every plan and beside every exercise that is done on one leg. */
export const ALWAYS_STOP =
  'Stop on pain, dizziness or numbness, and call your practitioner. Keep a support within reach.';

/** Answers that hold back everything on one leg. */
export const ONE_LEG: readonly SafetyAnswer[] = [
  'pain-today',
  'weight-bearing-limits',
  'recent-surgery-or-fracture',
  'falls-or-poor-balance',
  'vertigo-or-dizziness',
  'nerve-symptoms',
];

/** Answers that hold back what bends the hip far: a surgeon's movement limits come first. */
export const DEEP_HIP: readonly SafetyAnswer[] = ['hip-replacement-or-limits'];

/** Answers that hold back what leaves the floor. */
export const IMPACT: readonly SafetyAnswer[] = [...ONE_LEG, ...DEEP_HIP, 'confidential-any'];
