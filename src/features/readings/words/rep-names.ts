import type { Reading } from '#shared/contracts/readings.ts';

/** What a rep is called: its number, with its clip's name where the reading rests on several clips. */
export const repName = (reading: Pick<Reading, 'reps'>, id: string): string => {
  const rep = reading.reps.find((each) => each.id === id);
  if (!rep) return 'a rep that was deleted';
  const clips = new Set(reading.reps.map(({ clipId }) => clipId));
  return clips.size > 1 ? `rep ${rep.number} of ${rep.clipName}` : `rep ${rep.number}`;
};

export type NameOf = (repId: string) => string;
