import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Comment } from '#shared/contracts/comments.ts';
import type { Mark, MarkOutcome, Rep } from '#shared/contracts/reps.ts';

/** How answers of the server change the document that the Bench shows. Pure. */

const place = ({ frame, landmark }: Pick<Mark, 'frame' | 'landmark'>): string =>
  `${frame}/${landmark}`;

/** Marks as the server told them last; `touched` says which command was about which mark. */
export const marksAfter = (
  known: readonly Mark[],
  outcomes: readonly MarkOutcome[],
  touched: ReadonlyMap<string, Pick<Mark, 'frame' | 'landmark'>>,
): Mark[] => {
  const marks = new Map(known.map((mark) => [place(mark), mark]));
  for (const { id, mark } of outcomes) {
    if (mark) {
      const before = marks.get(place(mark));
      // answers can overtake each other between tabs
      if (!before || before.revision <= mark.revision) marks.set(place(mark), mark);
    } else {
      const gone = touched.get(id);
      if (gone) marks.delete(place(gone));
    }
  }
  return [...marks.values()];
};

/** The document with the marks of one rep as they stand now. */
export const withOutcomes = (
  document: BenchDocument,
  repId: string,
  outcomes: readonly MarkOutcome[],
  touched: ReadonlyMap<string, Pick<Mark, 'frame' | 'landmark'>>,
  rep: Rep,
): BenchDocument => ({
  ...document,
  reps: document.reps.map((each) => {
    if (each.rep.id !== repId) return each;
    return { rep: newer(each.rep, rep), marks: marksAfter(each.marks, outcomes, touched) };
  }),
});

const newer = (a: Rep, b: Rep): Rep => (b.version >= a.version ? b : a);

export const withRep = (document: BenchDocument, rep: Rep): BenchDocument => {
  const known = document.reps.some((each) => each.rep.id === rep.id);
  const reps = known
    ? document.reps.map((each) =>
        each.rep.id === rep.id ? { ...each, rep: newer(each.rep, rep) } : each,
      )
    : [...document.reps, { rep, marks: [] }];
  // a rep's number is its place in the clip
  const ordered = [...reps].sort(
    (a, b) => a.rep.startFrame - b.rep.startFrame || a.rep.endFrame - b.rep.endFrame,
  );
  return {
    ...document,
    reps: ordered.map((each, n) => ({ ...each, rep: { ...each.rep, number: n + 1 } })),
  };
};

export const withoutRep = (document: BenchDocument, repId: string): BenchDocument => ({
  ...document,
  reps: document.reps
    .filter((each) => each.rep.id !== repId)
    .map((each, n) => ({ ...each, rep: { ...each.rep, number: n + 1 } })),
});

/** The clip's facts; its table of frames never changes. */
export const withClip = (document: BenchDocument, clip: Clip): BenchDocument => ({
  ...document,
  clip: { ...document.clip, ...clip },
});

export const withComment = (document: BenchDocument, comment: Comment): BenchDocument => ({
  ...document,
  comments: document.comments.some((each) => each.id === comment.id)
    ? document.comments.map((each) => (each.id === comment.id ? comment : each))
    : [...document.comments, comment],
});

export const withoutComment = (document: BenchDocument, id: string): BenchDocument => ({
  ...document,
  comments: document.comments.filter((each) => each.id !== id),
});
