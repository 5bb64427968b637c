import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import type { LiveEvent, ToldEvent } from './tell.ts';

/** How many past events a stream that was cut can still be told of. */
const REMEMBERED = 500;

export interface Listener {
  readonly actor: UserActor;
  readonly sessionId: string;
  readonly send: (event: ToldEvent) => void;
  readonly close: () => void;
}

type Ear = Pick<Listener, 'actor' | 'sessionId'>;

const mayHear = ({ actor, sessionId }: Ear, { practiceId, scope }: ToldEvent): boolean => {
  if ('sessionId' in scope) return scope.sessionId === sessionId;
  if ('userId' in scope) return scope.userId === actor.id;
  const assigned = actor.role === 'supervisor' && scope.coachId !== actor.id;
  if (assigned && scope.supervised === false) return false;
  return can(actor, 'athlete.read', { kind: 'caseload', practiceId, coachId: scope.coachId });
};

/** Said anew while it lasts: no use to a stream that comes back, so neither remembered nor numbered. */
export const isFleeting = ({ type }: LiveEvent): boolean => type === 'here';

/** The open streams of this process, and the last events for those that come back. */
export class EventHub {
  readonly #listeners = new Set<Listener>();
  #past: ToldEvent[] = [];

  /** Takes in an event, from whichever process it came. */
  publish(event: ToldEvent): void {
    // what came before a withdrawal is told to nobody who comes back after it
    if (event.event.type === 'consent') this.#past = [];
    if (!isFleeting(event.event)) this.#past = [...this.#past.slice(-(REMEMBERED - 1)), event];
    for (const listener of this.#listeners) {
      if (!mayHear(listener, event)) continue;
      listener.send(event);
      if (event.event.type === 'signed-out') listener.close();
    }
  }

  /** @returns takes the listener out again */
  add(listener: Listener): () => void {
    this.#listeners.add(listener);
    return () => {
      this.#listeners.delete(listener);
    };
  }

  /**
   * What was told after the event with this id, as far as this listener may hear it; null where the id is not
   * remembered, so that nobody can say what was missed.
   */
  since(id: string, ear: Ear): ToldEvent[] | null {
    const at = this.#past.findIndex((event) => event.id === id);
    return at === -1 ? null : this.#past.slice(at + 1).filter((event) => mayHear(ear, event));
  }

  closeAll(): void {
    for (const listener of this.#listeners) listener.close();
  }

  get size(): number {
    return this.#listeners.size;
  }
}
