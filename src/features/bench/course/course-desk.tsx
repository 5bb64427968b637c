import { useBenchModel, useBenchTools } from '../bench-context.ts';
import { Button } from '#src/ui/button.tsx';
import { degrees, turn } from '#src/ui/figures.ts';
import { isDraft } from '../model/draft.ts';
import { EXCLUSION_WORDS } from '../reps/rep-words.ts';
import { useMedia } from '../use-media.ts';
import { useFrameFigures } from '../values/use-frame-figures.ts';
import { ReadingSoFar } from '../values/reading-so-far.tsx';
import { ValuesAtOnce, ValuesTable } from '../values/values-table.tsx';
import { missingWords } from '../values/value-words.ts';
import { CallFirst } from './call-first.tsx';
import { CourseView } from './course-view.tsx';

/** Course, values of the frame, and the reading so far. */
export function CourseDesk() {
  const { store } = useBenchTools();
  const { current, figures } = useBenchModel();
  const between = useMedia('(min-width: 901px) and (max-width: 1199px)');
  const wide = useMedia('(min-width: 1200px)');
  const low = useMedia('(max-height: 960px)');
  // the values must be seen below it without scrolling
  const height = between ? 284 : wide && low ? 258 : undefined;
  if (!current || isDraft(current))
    return (
      <div className="max-w-[34em] py-4">
        <h3 className="text-sub font-bold">No rep yet</h3>
        <p className="mt-1">
          {current
            ? 'Go to a frame on which the athlete stands still on both feet, and touch each landmark once. The computer follows the marks, finds the reps, and you look at what it did. Then the course is drawn here.'
            : 'Name each lift of this clip as a rep, with the leg stood on. Then marking begins, and the course is drawn here.'}
        </p>
        <p className="mt-4">
          <Button
            look={current ? 'secondary' : 'primary'}
            onClick={() => store.setState({ desk: 'reps' })}
          >
            {current ? 'Name the reps by hand' : 'Name a rep'}
          </Button>
        </p>
      </div>
    );
  if (!figures) return <CallFirst />;
  const { rep, courseMissing } = current;
  return (
    <>
      {rep.excluded && (
        <p className="text-note text-soft">
          Left out of the reading: {EXCLUSION_WORDS[rep.excluded].toLowerCase()}
          {rep.excludedNote === '' ? '' : `, ${rep.excludedNote}`}.
        </p>
      )}
      {rep.view !== 'front' ? (
        <p className="max-w-[34em] py-4">
          {rep.view === 'back'
            ? 'From behind neither lift nor turn is seen. Film from the front.'
            : 'From the side the lift is seen, not the turn. Film from the front for the course.'}
        </p>
      ) : courseMissing ? (
        <div className="max-w-[34em] py-4">
          <p>Nothing can be measured yet: {missingWords(courseMissing)}.</p>
          <p className="mt-3">
            <Button look="primary" onClick={() => store.setState({ desk: 'set-up' })}>
              Open the set-up
            </Button>
          </p>
        </div>
      ) : (
        <CourseView height={height} />
      )}
      {between ? (
        <FoldedValues />
      ) : wide ? (
        <ValuesAtOnce beside={<ReadingSoFar />} />
      ) : (
        <div className="bench-vals">
          <ValuesTable />
          <ReadingSoFar />
        </div>
      )}
    </>
  );
}

/** Between 901 and 1199 px the values fold under the course. */
function FoldedValues() {
  const shown = useFrameFigures()?.shown ?? null;
  const lift = shown?.lift ?? null;
  const turned = shown?.turn ?? null;
  const line = [
    lift === null ? null : `lift ${degrees(lift)}`,
    turned === null ? null : `turn ${turn(turned)}`,
    shown?.provisional ? 'provisional' : null,
  ]
    .filter((part) => part !== null)
    .join(' · ');
  return (
    <div className="mt-2 border-t border-rule pt-2">
      <details>
        <summary className="min-h-[44px] py-2.5">
          Values of this frame{line === '' ? '' : `: ${line}`}
        </summary>
        <ValuesTable />
      </details>
      <ReadingSoFar />
    </div>
  );
}
