import { LEAST_QUIET_FRAMES, quietFramesOf } from '#shared/records/shared-quiet.ts';
import { Button } from '#src/ui/button.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBenchDocument, useBenchModel } from '../bench-context.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { lendersOf } from './lenders.ts';

/** Lifts in a row (marching): a rep without a quiet stance of its own may take that of another rep of its side. */
export function QuietStance({ own }: { own: BenchRep }) {
  const { may } = useBenchDocument();
  const { reps } = useBenchModel();
  const edits = useEdits();
  const say = useStatus();
  const { rep } = own;
  const take = (quietFrom: string | null) =>
    void edits
      .editRep(rep.id, { quietFrom })
      .catch((error: unknown) =>
        say(error instanceof Error ? error.message : 'The rep was not changed.'),
      );
  if (rep.quietFrom !== null) {
    const lender = reps.find((each) => each.rep.id === rep.quietFrom);
    const enough = lender?.input && quietFramesOf(lender.input).length >= LEAST_QUIET_FRAMES;
    return (
      <p className="flex flex-wrap items-center gap-x-4 text-note text-soft">
        <span>
          Its zero is the quiet stance of rep {lender?.rep.number ?? '?'}
          {!enough && ', which is not marked: there is no turn until it is'}.
        </span>
        {may.mark && (
          <Button look="plain" onClick={() => take(null)}>
            Use its own
          </Button>
        )}
      </p>
    );
  }
  const lenders = may.mark ? lendersOf(own, reps) : [];
  if (lenders.length === 0) return null;
  return (
    <p className="flex flex-wrap items-center gap-x-4 text-note text-soft">
      <span>No quiet stance of its own: no turn.</span>
      {lenders.map(({ rep: { id, number } }) => (
        <Button key={id} look="plain" onClick={() => take(id)}>
          Use that of rep {number}
        </Button>
      ))}
    </p>
  );
}
