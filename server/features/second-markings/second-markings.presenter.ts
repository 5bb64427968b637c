import type {
  SecondAgreement,
  SecondMarkingDocument,
  SecondMarkingSummary,
} from '#shared/contracts/second-markings.ts';
import type { SecondResult } from '#shared/reliability/compare-markings.ts';
import { type MarkRepeat, markRepeatOf } from '#shared/reliability/summary.ts';
import { viewOf } from '#shared/records/views.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { User } from '../accounts/user.entity.ts';
import { presentClipWithFrames } from '../clips/clips.presenter.ts';
import { type MarkRow, presentMark } from '../marks/mark-store.ts';
import type { SecondInSight } from './second-marking-in-sight.ts';
import type { SecondMarking } from './second-marking.entity.ts';

/** What of each frame is asked and already said. */
const placesOf = (marks: readonly MarkRow[]): ReadonlySet<string> =>
  new Set(marks.map(({ frame, landmark }) => `${frame} ${landmark}`));

/** Frames on which everything that is asked was placed or hidden. */
export const framesDone = (
  { frames }: Pick<SecondMarking, 'frames'>,
  marks: readonly MarkRow[],
): number => {
  const there = placesOf(marks);
  return frames.filter(({ frame, landmarks }) =>
    landmarks.every((landmark) => there.has(`${frame} ${landmark}`)),
  ).length;
};

/** @param marking with `marker` and `askedBy` loaded */
export const presentSecondSummary = (
  marking: SecondMarking,
  marks: readonly MarkRow[],
  actorId: string,
): SecondMarkingSummary => ({
  id: marking.id,
  repId: marking.rep.id,
  marker: presentPerson(marking.marker.unwrap()),
  askedBy: presentPerson(marking.askedBy.unwrap()),
  askedAt: marking.askedAt.toISOString(),
  openedAt: marking.openedAt?.toISOString() ?? null,
  finishedAt: marking.finishedAt?.toISOString() ?? null,
  frames: marking.frames.length,
  framesDone: framesDone(marking, marks),
  mine: marking.marker.id === actorId,
});

export const presentMarkRepeat = (repeat: MarkRepeat) => ({
  ...repeat,
  landmarks: repeat.landmarks.map((each) => ({ ...each })),
});

/** @param people who placed the first marks */
export const presentAgreement = (
  repId: string,
  { marks, mmPerPx, hiddenOnce, readings }: SecondResult,
  people: readonly User[],
): SecondAgreement => ({
  repeat: presentMarkRepeat(markRepeatOf([{ repId, marks, mmPerPx }])),
  firstBy: people.map(presentPerson),
  hiddenOnce,
  readings: readings && { first: readings[0], second: readings[1] },
});

/** Lists what leaves, name by name: nothing of the first marking is among it. */
export const presentSecondMarking = (
  { marking, rep, clip, athlete }: SecondInSight,
  given: {
    readonly marks: readonly MarkRow[];
    readonly repNumber: number;
    readonly repCount: number;
    readonly agreement: SecondAgreement | null;
    readonly protocol: SecondMarkingDocument['protocol'];
    readonly actorId: string;
  },
): SecondMarkingDocument => {
  const visit = clip.visit.unwrap();
  return {
    summary: presentSecondSummary(marking, given.marks, given.actorId),
    athlete: { id: athlete.id, name: `${athlete.givenName} ${athlete.familyName}` },
    visit: { id: visit.id, day: visit.day },
    clip: presentClipWithFrames(clip, given.repCount),
    repNumber: given.repNumber,
    supportSide: rep.supportSide,
    view: viewOf(clip.cameraStood, rep.supportSide),
    frames: marking.frames.map(({ frame, landmarks }) => ({ frame, landmarks: [...landmarks] })),
    marks: given.marks.map(presentMark),
    protocol: given.protocol,
    agreement: given.agreement,
  };
};
