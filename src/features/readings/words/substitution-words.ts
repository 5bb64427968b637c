/** What a change of each measure means, towards plus and towards minus. */
const DIRECTION: Readonly<Record<string, readonly [plus: string, minus: string]>> = {
  'trunk-side-bend': ['to the support side', 'away from the support side'],
  'pelvic-obliquity': ['hike', 'drop'],
  'support-hip-adduction': ['adduction', 'abduction'],
  'frontal-plane-projection': ['knee inward', 'knee outward'],
  'foot-turn-out': ['toes outward', 'toes inward'],
  'heel-rise': ['heel up', 'heel down'],
  'lifted-shank-swing': ['foot to the midline', 'foot outward'],
  'lifted-knee-drift': ['across', 'away'],
  'pelvic-tilt': ['forward', 'backward'],
  'support-hip-extension': ['extension', 'flexion'],
};

/** Which way a change goes, in words; empty for a measure without such words. */
export const directionWords = (measure: string, change: number): string => {
  const words = DIRECTION[measure];
  return words ? words[change < 0 ? 1 : 0] : '';
};

/** What a change that is more than its error may do to the turn, where there is something to say. */
export const meaningOf = (measure: string): string | null => {
  switch (measure) {
    case 'foot-turn-out':
      return 'Part of the turn may start at the floor: look at the foot.';
    case 'heel-rise':
      return 'On a raised heel the whole leg turns more easily.';
    case 'lifted-shank-swing':
      return 'The lifted hip may have turned instead.';
    case 'pelvic-obliquity':
      return 'Part of the lift may come from the pelvis.';
    default:
      return null;
  }
};
