import type { Purpose } from '#shared/contracts/consents.ts';
import type { Seen, SeenSubstitution } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Exclusion } from '#shared/contracts/reps.ts';
import type { DemoAccount } from './accounts.ts';

/** Consent to all that the product does. */
export const EVERYTHING: readonly Purpose[] = ['assessment', 'supervision', 'sharing-by-link'];

/** A call by eye of the demo. */
export interface CallStory {
  readonly side: Side;
  readonly seen: Seen;
  readonly substitutions?: readonly SeenSubstitution[];
  readonly confidence: 'guess' | 'fairly-sure' | 'sure';
  readonly handsFelt?: string;
  /** The coach has handed the side in for review. */
  readonly handedIn?: boolean;
}

/** Words at a moment of one rep, first to last of a thread. */
export interface ThreadStory {
  readonly rep: number;
  /** Degrees; the first frame of the rise that reaches it. */
  readonly lift: number;
  /** The landmark that a ring is drawn around. */
  readonly ringAt?: string;
  readonly words: readonly { readonly by: 'coach' | 'supervisor'; readonly body: string }[];
  readonly shared?: boolean;
  readonly resolved?: boolean;
}

/** A rendered clip, with what the coach did to it. */
export interface RenderedSource {
  readonly rendered: string;
  readonly supportSide: Side | null;
  /** Which of its reps, counted from 0, are named, and which of those are marked. */
  readonly named: readonly number[];
  readonly marked: readonly number[];
  readonly seed: number;
  /** Standard deviation of a mark, px. */
  readonly spreadPx: number;
  /** Some marks came from tracking and nobody has looked at them. */
  readonly hollow?: boolean;
  readonly excluded?: Readonly<Record<number, Exclusion>>;
  /** An earlier clip of the visit, of the same lifts: its reps take their lift from this one's, by number. */
  readonly liftFor?: string;
  readonly threads?: readonly ThreadStory[];
}

export interface ClipStory {
  /** What the phone called it. */
  readonly name: string;
  readonly source:
    | RenderedSource
    /** The first part of a rendered file, as after a lost connection on the phone. */
    | { readonly cut: string; readonly share: number }
    | { readonly text: string };
}

export interface VisitStory {
  readonly daysAgo: number;
  readonly note?: string;
  readonly clips: readonly ClipStory[];
  readonly calls: readonly CallStory[];
  /** A replay link to a rep of the first clip. */
  readonly replay?: { readonly side: Side; readonly rep: number; readonly message: string };
}

export interface AthleteStory {
  readonly givenName: string;
  readonly familyName: string;
  readonly age: number;
  readonly heightMm: number;
  readonly sport: string;
  readonly cautions?: string;
  readonly consent: {
    readonly purposes: readonly Purpose[];
    readonly daysLeft: number;
    readonly guardian?: { readonly name: string; readonly relation: string };
  } | null;
  readonly visits: readonly VisitStory[];
}

/** A practice, its people and the caseload of its coach. */
export interface PracticeStory {
  readonly id: string;
  readonly name: string;
  readonly contact: string;
  readonly coach: DemoAccount;
  readonly supervisor: DemoAccount | null;
  readonly owner: DemoAccount | null;
  readonly athletes: readonly AthleteStory[];
}

/** A clip with its place in the story. */
export interface PlacedClip {
  readonly athlete: AthleteStory;
  readonly visit: VisitStory;
  readonly clip: ClipStory;
  /** Names of athlete, visit and clip: what ids are made of. */
  readonly visitPlace: readonly (string | number)[];
  readonly clipPlace: readonly (string | number)[];
}

export const placesOf = ({ givenName, familyName }: AthleteStory, { daysAgo }: VisitStory) =>
  ['visit', givenName, familyName, daysAgo] as const;

export const clipPlaceOf = (visitPlace: PlacedClip['visitPlace'], name: string) =>
  ['clip', ...visitPlace, name] as const;

export const clipsOf = (story: PracticeStory): PlacedClip[] =>
  story.athletes.flatMap((athlete) =>
    athlete.visits.flatMap((visit) =>
      visit.clips.map((clip) => {
        const visitPlace = placesOf(athlete, visit);
        return { athlete, visit, clip, visitPlace, clipPlace: clipPlaceOf(visitPlace, clip.name) };
      }),
    ),
  );
