/**
 * What would be lost by signing out: marks that are not sent yet, a clip that is half sent. Each guard
 * answers with a sentence, or null where nothing would be lost.
 */
export type LeavingGuard = () => Promise<string | null>;
const guards = new Set<LeavingGuard>();

/** Returns how to take the guard away. */
export function guardLeaving(guard: LeavingGuard): () => void {
  guards.add(guard);
  return () => void guards.delete(guard);
}

export async function whatWouldBeLost(): Promise<string[]> {
  const answers = await Promise.all([...guards].map((guard) => guard()));
  return answers.filter((answer) => answer !== null);
}
