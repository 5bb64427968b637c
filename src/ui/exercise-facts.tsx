import type { ReactNode } from 'react';
import type { Exercise } from '#shared/plan/exercise.ts';

export type ExerciseWords = Pick<
  Exercise,
  'setUp' | 'foot' | 'cues' | 'easier' | 'harder' | 'goOnWhen' | 'goBackWhen' | 'notWhen'
> & { readonly sideLines: readonly string[] };

/** How an exercise is done and judged, in the order in which it is needed. */
export function ExerciseFacts({
  exercise,
  cue = '',
}: {
  exercise: ExerciseWords;
  /** The coach's own; null where what to think of stands above already. */
  cue?: string | null;
}) {
  const { setUp, sideLines, foot, cues, easier, harder, goOnWhen, goBackWhen, notWhen } = exercise;
  return (
    <dl className="grid gap-x-6 gap-y-3 phone:grid-cols-[112px_minmax(0,1fr)] print:grid-cols-[96px_minmax(0,1fr)_96px_minmax(0,1fr)] print:gap-x-3 print:gap-y-1">
      <Fact name="Set up">
        <Lines lines={setUp} ordered />
      </Fact>
      <Fact name="Side">
        <Lines lines={sideLines} />
      </Fact>
      <Fact name="Foot">{foot}</Fact>
      {cue !== null && (
        <Fact name="Think of">
          <Lines lines={cue === '' ? cues : [cue, ...cues]} />
        </Fact>
      )}
      <Fact name="Easier">{easier}</Fact>
      <Fact name="Harder">{harder}</Fact>
      <Fact name="Go on when">
        <Lines lines={goOnWhen} />
      </Fact>
      <Fact name="Go back when">
        <Lines lines={goBackWhen} />
      </Fact>
      {notWhen.length > 0 && (
        <Fact name="Not with">
          <Lines lines={notWhen} />
        </Fact>
      )}
    </dl>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="contents">
      <dt className="font-bold max-phone:-mb-3">{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function Lines({ lines, ordered = false }: { lines: readonly string[]; ordered?: boolean }) {
  const [only, ...more] = lines;
  if (more.length === 0) return only;
  const List = ordered ? 'ol' : 'ul';
  return (
    <List className={ordered ? 'list-decimal pl-5' : 'list-disc pl-5'}>
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </List>
  );
}
