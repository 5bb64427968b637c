/** Work on this device that signing out would throw away: marks not sent yet, a clip half sent. */
export type LeavingGuard = {
  /** One sentence, or null where nothing would be lost. */
  wouldLose: () => Promise<string | null>;
  /** Called once the person has signed out: nothing of theirs may be left here. */
  discard: () => void;
};
const guards = new Set<LeavingGuard>();

/** Returns how to take the guard away. */
export function guardLeaving(guard: LeavingGuard): () => void {
  guards.add(guard);
  return () => void guards.delete(guard);
}

export async function whatWouldBeLost(): Promise<string[]> {
  const answers = await Promise.all([...guards].map((guard) => guard.wouldLose()));
  return answers.filter((answer) => answer !== null);
}

export function discardAll(): void {
  for (const guard of guards) guard.discard();
}
