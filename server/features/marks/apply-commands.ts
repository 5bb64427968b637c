import type { MarkCommand } from '#shared/contracts/reps.ts';
import type { MarkRow } from './mark-store.ts';

/** Who does it and when. */
export interface Hand {
  readonly repId: string;
  readonly byUser: string;
  readonly byName: string;
  readonly at: Date;
}

/** What became of one command; `row` is what is stored then, removed marks included. */
export interface Outcome {
  readonly command: MarkCommand;
  readonly outcome: 'applied' | 'already-applied' | 'conflict';
  readonly row: MarkRow | null;
}

export const placeOf = ({ frame, landmark }: { frame: number; landmark: string }): string =>
  `${frame} ${landmark}`;

const REMOVED = { present: false, hidden: false, u: null, v: null } as const;
const HIDDEN = { present: true, hidden: true, u: null, v: null } as const;
const BY_HAND = { source: 'hand', looked: true, confidence: null } as const;

const changed = (
  { set, frame, landmark }: MarkCommand,
  before: MarkRow | null,
  hand: Hand,
): MarkRow => {
  const place = { frame, landmark, ...hand, revision: (before?.revision ?? 0) + 1 };
  const pictureLongEdge = before?.pictureLongEdge ?? 0;
  switch (set.to) {
    case 'none':
      return { ...place, ...REMOVED, ...BY_HAND, pictureLongEdge };
    case 'hidden':
      return { ...place, ...HIDDEN, ...BY_HAND, pictureLongEdge };
    case 'point': {
      const { u, v, source, looked, confidence } = set;
      const byHand = source === 'hand';
      return {
        ...place,
        present: true,
        hidden: false,
        u,
        v,
        source,
        // a hand looks at what it places
        looked: byHand || looked,
        confidence: byHand ? null : confidence,
        pictureLongEdge: set.pictureLongEdge,
      };
    }
  }
};

/**
 * Does commands in their order on what is stored. A command that was done before does nothing again; one that saw
 * an older revision than the stored one is a conflict and changes nothing. Two commands of one batch may build on
 * each other.
 * @param stored rows by `placeOf`
 * @param done ids of commands done before
 */
export const applyCommands = (
  commands: readonly MarkCommand[],
  stored: ReadonlyMap<string, MarkRow>,
  done: ReadonlySet<string>,
  hand: Hand,
): readonly Outcome[] => {
  const now = new Map(stored);
  const doneNow = new Set(done);
  return commands.map((command) => {
    const place = placeOf(command);
    const before = now.get(place) ?? null;
    if (doneNow.has(command.id)) return { command, outcome: 'already-applied', row: before };
    if ((before?.revision ?? 0) !== command.baseRevision)
      return { command, outcome: 'conflict', row: before };
    const row = changed(command, before, hand);
    now.set(place, row);
    doneNow.add(command.id);
    return { command, outcome: 'applied', row };
  });
};

/** The last row of every place that a batch has changed. */
export const changedRows = (outcomes: readonly Outcome[]): MarkRow[] => [
  ...new Map(
    outcomes.flatMap(({ command, outcome, row }) =>
      outcome === 'applied' && row ? [[placeOf(command), row] as const] : [],
    ),
  ).values(),
];
