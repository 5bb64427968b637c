import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useSyncExternalStore } from 'react';
import type { FrameMarks, MarkValue } from '#shared/landmarks/commands.ts';
import { landmark } from '#shared/landmarks/table.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import { valueOf } from '#shared/records/stored-marks.ts';
import { useMe } from '#src/api/me.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { turn as turnText } from '#src/ui/figures.ts';
import { initials } from '#src/ui/initials.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { marksOn } from '../model/bench-model.ts';
import type { Disputed, QueuedMark } from '../queue/queue-core.ts';
import { figuresOf } from '../values/frame-figures.ts';
import { ConflictGlass } from './conflict-glass.tsx';

type DisputedMark = QueuedMark & { readonly state: Disputed };
const isDisputed = (mark: QueuedMark): mark is DisputedMark => mark.state.is === 'disputed';

/** Two people have set one mark: both in one glass, each with its own turn, until one decides. */
export function ConflictInset() {
  const { queue, times, frameSize } = useBenchTools();
  const { user } = useMe();
  const { current, figures } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const { marks: queued } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const disputed = queued.find(
    (each): each is DisputedMark =>
      isDisputed(each) && each.repId === current?.rep.id && each.frame === frame,
  );
  const theirs = disputed?.state.theirs ?? null;
  const theirValue = theirs && valueOf(theirs);
  if (!disputed || !current) return null;

  const longEdge = longEdgeOf(frameSize);
  /** The turn of this frame, were this the mark. */
  const turnWith = (value: MarkValue | null): string => {
    const time = times[frame];
    if (!figures || time === undefined) return '';
    const here = marksOn(current, frame);
    const { [disputed.landmark]: _own, ...rest } = here;
    const marks: FrameMarks = value ? { ...rest, [disputed.landmark]: value } : rest;
    const { shown } = figuresOf(current, { frame, time, marks: engineMarks(marks, longEdge) });
    const { turn } = shown ?? { turn: null };
    return turn === null ? 'no turn' : `turn ${turnText(turn)}`;
  };
  const mine = disputed.after;
  const name = theirs?.by.name ?? 'Somebody';
  const [firstName] = name.split(' ');
  const apart =
    mine?.to === 'point' && theirValue?.to === 'point'
      ? Math.hypot(mine.point.u - theirValue.point.u, mine.point.v - theirValue.point.v)
      : null;
  const ofThem = theirs ? `${initials(name)}, ${firstName}, ${moment(theirs.at)}` : 'Theirs';
  return (
    <section className="bench-inset" aria-label="Two people set the same mark">
      <p className="text-note leading-5 text-soft">
        Frame {frame}, {landmark(disputed.landmark).label.toLowerCase()}
      </p>
      <h2 className="text-lead font-bold leading-[26px]">
        {theirs ? `${firstName} moved the same mark` : 'Somebody took this mark away'}
      </h2>
      {(mine?.to === 'point' || theirValue?.to === 'point') && (
        <ConflictGlass
          landmark={disputed.landmark}
          mine={{ value: mine, tag: initials(user.name) }}
          theirs={{ value: theirValue, tag: theirs ? initials(name) : '' }}
        />
      )}
      <dl className="my-2 text-note">
        {[
          { who: `${initials(user.name)}, you`, value: mine },
          { who: ofThem, value: theirValue },
        ].map(({ who, value }) => (
          <div key={who} className="flex justify-between gap-2 border-b border-rule py-0.5">
            <dt>{who}</dt>
            <dd className="whitespace-nowrap font-bold">
              {value === null ? 'not marked' : value.to === 'hidden' ? 'hidden' : turnWith(value)}
            </dd>
          </div>
        ))}
      </dl>
      <p className="text-caption text-soft">
        {apart !== null && `${apart.toFixed(apart < 10 ? 1 : 0)} px of the phone’s picture apart. `}
        Both are kept until one of you decides; the other one sees what became of it.
      </p>
      <div className="mt-3 flex gap-2">
        <Button
          look="primary"
          className="flex-1 !px-2"
          onClick={() => void queue.keepMine(disputed.id)}
        >
          Keep mine
        </Button>
        <Button className="flex-1 !px-2" onClick={() => void queue.letGo([disputed.id])}>
          Keep theirs
        </Button>
      </div>
    </section>
  );
}
