import { type Annotated, urn } from '#shared/exports/annotations.ts';
import { spanOfFrames } from '#shared/exports/media-fragment.ts';
import { landmark } from '#shared/landmarks/table.ts';
import { isLandmark } from '#shared/records/stored-marks.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Comment } from '../comments/comment.entity.ts';
import { presentMark } from '../marks/mark-store.ts';
import { timesOfClip } from '../reps/reps.presenter.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';

/** Where the clips of this instance are found. */
export interface Addresses {
  readonly publicUrl: string;
}

const videoOf = ({ publicUrl }: Addresses, clipId: string): string =>
  `${publicUrl}/api/clips/${clipId}/video`;

/** A rep as an annotation of its span, then every placed mark as one of its frame. */
export const annotatedRep = (stored: NumberedRep, to: Addresses): Annotated[] => {
  const { rep, clip, marks, number } = stored;
  const times = timesOfClip(clip);
  const source = videoOf(to, clip.id);
  const span = spanOfFrames(times, rep.startFrame, rep.endFrame);
  if (!span) return [];
  const placed = marks.map(presentMark).flatMap((mark): Annotated[] => {
    const at = spanOfFrames(times, mark.frame, mark.frame);
    if (!at || mark.u === null || mark.v === null || !isLandmark(mark.landmark)) return [];
    return [
      {
        kind: 'mark',
        id: `${to.publicUrl}/api/reps/${rep.id}/marks#${mark.frame}-${mark.landmark}`,
        source,
        span: at,
        label: landmark(mark.landmark).label,
        u: mark.u,
        v: mark.v,
      },
    ];
  });
  return [
    {
      kind: 'rep',
      id: urn(rep.id),
      source,
      span,
      label: `Rep ${number}, standing on the ${rep.supportSide} leg`,
    },
    ...placed,
  ];
};

/** @param comment with `by` loaded */
export const annotatedComment = (
  comment: Comment,
  times: readonly Milliseconds[],
  to: Addresses,
): Annotated[] => {
  const span = spanOfFrames(times, comment.fromFrame, comment.toFrame);
  if (!span) return [];
  const by = comment.by.unwrap();
  return [
    {
      kind: 'comment',
      id: urn(comment.id),
      source: videoOf(to, comment.clip.id),
      span,
      text: comment.body,
      shape: comment.shape ?? null,
      answerTo: comment.answerTo ? urn(comment.answerTo) : null,
      by: { id: urn(by.id), name: by.name },
      at: comment.at.toISOString(),
      editedAt: comment.editedAt?.toISOString() ?? null,
    },
  ];
};
