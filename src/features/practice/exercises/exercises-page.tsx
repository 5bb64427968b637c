import { useState } from 'react';
import { EXERCISES } from '#shared/plan/library.ts';
import { heldBackBy } from '#shared/plan/held-back.ts';
import { sideLines } from '#shared/plan/sides.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Exercise } from '#shared/plan/exercise.ts';
import type { ExerciseId } from '#shared/plan/library.ts';
import { ExerciseDrawing } from '#src/ui/exercise-drawing.tsx';
import { ExerciseFacts } from '#src/ui/exercise-facts.tsx';
import { doseWords, SAFETY_SHORT } from '#src/ui/exercise-words.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Segmented } from '#src/ui/segmented.tsx';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { RulesSection } from './rules-section.tsx';

const SIDES = [
  { value: 'right', label: 'Right leg' },
  { value: 'left', label: 'Left leg' },
] as const;

/** `/practice/exercises`: every exercise that a plan can hold, from easy to hard, and the rules that suggest them. */
export function ExercisesPage() {
  const [side, setSide] = useState<Side>('right');
  useHashTarget();
  return (
    <Page
      title="Exercises"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'exercises' }]}
      lead="What plans are made of, from easy to hard, and the rules by which a finding leads to some of them. Common practice, no source."
    >
      <RulesSection />
      <Section
        title="Shown for"
        note="the leg stood on in the test"
        margin={
          <p>Drawings and sides turn with it. The leg stood on is vermilion, the other teal.</p>
        }
      >
        <Segmented legend="Stood on in the test" choices={SIDES} value={side} onChange={setSide} />
      </Section>
      {EXERCISES.map((exercise) => (
        <OneExercise key={exercise.id} exercise={exercise} side={side} />
      ))}
    </Page>
  );
}

function OneExercise({ exercise, side }: { exercise: Exercise<ExerciseId>; side: Side }) {
  const held = heldBackBy(exercise, null);
  return (
    <Section
      id={exercise.id}
      title={exercise.name}
      note={doseWords(exercise.dose)}
      margin={
        <>
          <p>{exercise.side.because}</p>
          <p>
            {held.length === 0
              ? 'No answer of the safety check holds it back.'
              : `Held back for ${held.map((question) => SAFETY_SHORT[question]).join('; ')}, and where that was not asked.`}
          </p>
          <p>Source: {exercise.source}.</p>
        </>
      }
    >
      <p className="mb-4 max-w-lead text-lead">{exercise.purpose}</p>
      <div className="mb-5 max-w-[480px]">
        <ExerciseDrawing exercise={exercise.id} side={side} />
      </div>
      <ExerciseFacts exercise={{ ...exercise, sideLines: sideLines(exercise.side, side) }} />
    </Section>
  );
}
