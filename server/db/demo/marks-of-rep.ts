import { landmark, landmarksIn } from '#shared/landmarks/table.ts';
import type { MarkRow } from '../../features/marks/mark-store.ts';
import { framesToMark } from './frames-to-mark.ts';
import { normalNoise } from './noise.ts';
import type { DemoRep, DemoTruth } from './truth.ts';

/** How the demo's coach marks. */
export interface Hand {
  readonly repId: string;
  readonly byUser: string;
  readonly at: Date;
  readonly seed: number;
  /** Standard deviation of a mark, px; tape and pointer tips are found twice as well. */
  readonly spreadPx: number;
  /** Share of the frames whose marks came from tracking and that nobody has looked at. */
  readonly hollow?: boolean;
}

/**
 * Places and noise of one rep's marks. Something covered is marked hidden, unless a landmark set rests on it, as in
 * a front clip: that the coach finds again from its neighbours and from the frames around, half as well.
 */
export const marksOfRep = (
  truth: DemoTruth,
  rep: DemoRep,
  { repId, byUser, at, seed, spreadPx, hollow = false }: Hand,
): Omit<MarkRow, 'byName'>[] => {
  const noise = normalNoise(seed);
  const { marks, hidden } = truth.frames;
  const shown = landmarksIn(truth.view).filter((id) => marks[id]);
  return framesToMark(truth, rep).flatMap((frame, index) =>
    shown.map((id) => {
      const { errorClass, sets } = landmark(id);
      const unseen = (hidden[id] ?? []).some(([from, to]) => frame >= from && frame <= to);
      const covered = unseen && (sets.length === 0 || truth.view !== 'front');
      const spread = spreadPx * (errorClass === 'pointer' ? 0.5 : 1) * (unseen ? 2 : 1);
      const [du, dv] = [spread * noise(), spread * noise()];
      const tracked = hollow && index % 3 === 1 && !covered;
      return {
        repId,
        frame,
        landmark: id,
        present: true,
        hidden: covered,
        u: covered ? null : (marks[id]?.[2 * frame] ?? NaN) + du,
        v: covered ? null : (marks[id]?.[2 * frame + 1] ?? NaN) + dv,
        source: tracked ? 'tracked' : 'hand',
        looked: !tracked,
        confidence: tracked ? 0.82 : null,
        pictureLongEdge: truth.picture.height,
        revision: 1,
        byUser,
        at,
      } as const;
    }),
  );
};
