import type { ReactNode } from 'react';
import { Button } from '#src/ui/button.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { tieFaultWords } from '#src/ui/tie-words.ts';
import type { RepChange } from '../actions/rep-change.ts';
import { useEdits } from '../actions/use-edits.ts';
import { useBenchDocument, useBenchTools } from '../bench-context.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { otherRepName, partnersOf } from './side-reps.ts';

const Line = ({ children }: { children: ReactNode }) => (
  <p className="flex flex-wrap items-center gap-x-4 text-note text-soft">{children}</p>
);

/** Two clips of one rep: a front rep takes its lift from a side clip of the same moment, or says why it does not. */
export function TiedLift({ own }: { own: BenchRep }) {
  const document = useBenchDocument();
  const { store } = useBenchTools();
  const edits = useEdits();
  const say = useStatus();
  const { rep, tieFault } = own;
  const partners = partnersOf(rep, document);
  const { mark: mayMark } = document.may;
  if (partners.length === 0 && rep.liftFrom === null) return null;
  const change = (edit: RepChange) =>
    void edits
      .editRep(rep.id, edit)
      .catch((error: unknown) =>
        say(error instanceof Error ? error.message : 'The rep was not changed.'),
      );
  const side = document.otherReps.find((other) => other.rep.id === rep.liftFrom);
  const name = side ? otherRepName(side) : 'a rep of another clip';
  const tied = rep.liftFrom !== null || partners.some((other) => other.rep.liftFrom === rep.id);
  return (
    <>
      {rep.liftFrom !== null && (
        <Line>
          <span>
            {tieFault
              ? `Not tied to ${name}: ${tieFaultWords(tieFault)}. Lift is taken from this clip.`
              : `Lift is taken from ${name}, filmed at the same time; turn from this clip.`}
          </span>
          {mayMark && (
            <Button look="plain" onClick={() => change({ liftFrom: null })}>
              Not filmed at the same time
            </Button>
          )}
        </Line>
      )}
      {rep.liftFrom === null && rep.view === 'front' && mayMark && (
        <Line>
          <span>Filmed at the same time as</span>
          {partners.map((other) => (
            <Button
              key={other.rep.id}
              look="plain"
              onClick={() => change({ liftFrom: other.rep.id })}
            >
              {otherRepName(other)}
            </Button>
          ))}
        </Line>
      )}
      {tied && (
        <Line>
          {rep.clapFrame !== null && <span>A clap on frame {rep.clapFrame}.</span>}
          {mayMark && (
            <Button look="plain" onClick={() => change({ clapFrame: store.getState().frame })}>
              Clap on the frame on show
            </Button>
          )}
          {mayMark && rep.clapFrame !== null && (
            <Button look="plain" onClick={() => change({ clapFrame: null })}>
              No clap
            </Button>
          )}
        </Line>
      )}
    </>
  );
}
