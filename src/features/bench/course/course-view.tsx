import { liftText } from '#shared/overlay/figures.ts';
import { CourseCurrent, CourseNext } from '#src/ui/plots/course-markers.tsx';
import { CoursePlot } from '#src/ui/plots/course-plot.tsx';
import { turnAt } from '#shared/reading/at-lift.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { gainWords } from '../lead/next-frame-offer.tsx';
import { useNextFrame } from '../lead/use-suggestion.ts';
import { liftAt } from '../model/hill.ts';
import { useReading } from '../reading/use-reading.ts';
import { useNarrow } from '../use-media.ts';
import { useFrameFigures } from '../values/use-frame-figures.ts';
import { CourseTravel } from './course-travel.tsx';
import { courseLabel } from './course-words.ts';

const LEAST_QUIET = 3;

/** The course of the current rep: its points at once, its line and band when the worker has them. */
export function CourseView({ height }: { height?: number }) {
  const { times } = useBenchTools();
  const { current } = useBenchModel();
  const { result } = useReading();
  const frame = useBench((state) => state.frame);
  const figures = useFrameFigures();
  const next = useNextFrame();
  const gates = gatesOf(useBenchDocument().protocol.rules);
  const narrow = useNarrow();
  if (!current) return null;
  const own = result?.reps.find((each) => each.id === current.rep.id);
  const curve = own?.curve ?? [];
  const points = current.frames.flatMap((each) =>
    each.phase === 'rise' && each.lift !== null && each.turn !== null && each.lift >= 15
      ? [
          {
            lift: each.lift,
            turn: each.turn,
            rep: 0,
            hollow: each.provisional,
          },
        ]
      : [],
  );
  const time = times[frame];
  const lift = figures?.shown?.lift ?? (time === undefined ? null : liftAt(current.hill, time));
  const turn = figures?.shown?.turn ?? null;
  const nextLift = next?.lift ?? null;
  const quiet = current.frames.filter((each) => each.phase === 'quiet').length;
  const empty =
    points.length > 0
      ? undefined
      : quiet >= LEAST_QUIET
        ? ['Now frames of the rise;', 'the course draws itself as you go on.']
        : [
            'Mark three quiet frames first;',
            narrow ? 'the course follows.' : 'the course draws itself as you go on.',
          ];
  return (
    <div className="bench-course">
      <CourseTravel>
        <CoursePlot
          label={courseLabel(current.frames, current.rep.number, gates)}
          height={height}
          gates={gates}
          curve={curve}
          points={points}
          empty={empty}
        >
          {(scale) => (
            <>
              {next && nextLift !== null && (
                <CourseNext
                  lift={nextLift}
                  turn={turnAt(curve, nextLift) ?? 0}
                  words={[`mark here next: frame ${next.frame}`, gainWords(next, gates)]}
                  scale={scale}
                />
              )}
              {lift !== null && lift >= 15 && lift <= 112 && (
                <CourseCurrent
                  lift={lift}
                  liftWords={liftText(lift, current.rep.view === 'front', 0)}
                  turn={turn}
                  scale={scale}
                />
              )}
            </>
          )}
        </CoursePlot>
      </CourseTravel>
      {curve.length > 0 && (
        <p className="text-caption text-soft">
          Band: 95 % of the change from {gates.from}°, under our error model.
          {points.some((point) => point.hollow) &&
            ' Hollow points rest on marks nobody has looked at.'}
        </p>
      )}
      {narrow && next && nextLift !== null && (
        <p className="mt-2">
          <b>Mark here next: frame {next.frame}</b>, the open ring at {Math.round(nextLift)}°.{' '}
          {next.gain && `${gainWords(next, gates).replace('reading', 'Reading')}.`}
        </p>
      )}
    </div>
  );
}
