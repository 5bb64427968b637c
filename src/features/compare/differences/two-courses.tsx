import type { ComparedCourse } from '#shared/reading/compare-courses.ts';
import { turnsToHold } from '#shared/plots/course-shapes.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import { turn } from '#src/ui/figures.ts';
import { SecondCourse } from '#src/ui/plots/second-course.tsx';
import { CoursePlot } from '#src/ui/plots/course-plot.tsx';

const says = ({ curve, gates }: ComparedCourse): string => {
  const [from, to] = [turnAt(curve, gates.from), turnAt(curve, gates.to)];
  return from === null || to === null
    ? 'nothing could be fitted'
    : `turn ${turn(from)} at ${gates.from}° of lift, ${turn(to)} at ${gates.to}°`;
};

/** Both courses in one plot, each with its band: the first a full line, the second dashed. */
export function TwoCourses({
  courses,
  names,
}: {
  courses: readonly [ComparedCourse, ComparedCourse];
  names: readonly [string, string];
}) {
  const [first, second] = courses;
  return (
    <>
      <CoursePlot
        label={`First, full line, ${names[0]}: ${says(first)}. Second, dashed, ${names[1]}: ${says(second)}.`}
        gates={first.gates}
        curve={first.curve}
        points={[]}
        reach={[...turnsToHold(second.curve, second.gates)]}
      >
        {(scale) => <SecondCourse curve={second.curve} scale={scale} />}
      </CoursePlot>
      <ul className="mt-2 text-note">
        <li>
          <span
            aria-hidden="true"
            className="mr-2 inline-block w-8 border-t-[3px] border-shank align-middle"
          />
          First, full line: {names[0]}
        </li>
        <li>
          <span
            aria-hidden="true"
            className="mr-2 inline-block w-8 border-t-[3px] border-dashed border-ink align-middle"
          />
          Second, dashed: {names[1]}
        </li>
      </ul>
    </>
  );
}
