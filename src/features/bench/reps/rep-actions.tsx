import { useState } from 'react';
import type { Exclusion } from '#shared/contracts/reps.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBench } from '../bench-context.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { EXCLUSION_WORDS } from './rep-words.ts';

/** What can be done with a rep: move its ends to the frame on show, leave it out, delete it. */
export function RepActions({ own }: { own: BenchRep }) {
  const { rep, marks } = own;
  const edits = useEdits();
  const say = useStatus();
  const frame = useBench((state) => state.frame);
  const [leavingOut, setLeavingOut] = useState(false);
  const edit = (change: Parameters<typeof edits.editRep>[1]) =>
    edits
      .editRep(rep.id, change)
      .catch((error: unknown) =>
        say(error instanceof Error ? error.message : 'The rep was not changed.'),
      );
  return (
    <>
      {frame < rep.endFrame && frame !== rep.startFrame && (
        <Button look="plain" onClick={() => void edit({ startFrame: frame })}>
          Start at frame {frame}
        </Button>
      )}
      {frame > rep.startFrame && frame !== rep.endFrame && (
        <Button look="plain" onClick={() => void edit({ endFrame: frame })}>
          End at frame {frame}
        </Button>
      )}
      {rep.excluded ? (
        <Button look="plain" onClick={() => void edit({ excluded: null, excludedNote: '' })}>
          Take in again
        </Button>
      ) : (
        <Button look="plain" onClick={() => setLeavingOut(true)}>
          Leave out
        </Button>
      )}
      <ConfirmButton
        label="Delete"
        look="plain"
        title={`Delete rep ${rep.number}?`}
        confirm={`Delete rep ${rep.number}`}
        onConfirm={() => edits.deleteRep(rep.id)}
      >
        <p>
          {marks.size === 0
            ? 'It has no marks yet.'
            : `Its marks on ${marks.size} ${marks.size === 1 ? 'frame' : 'frames'} are deleted with it. `}
          This cannot be taken back. To keep it visible but out of the reading, leave it out.
        </p>
      </ConfirmButton>
      {leavingOut && (
        <LeaveOut
          onClose={() => setLeavingOut(false)}
          onChoose={(excluded, excludedNote) => edits.editRep(rep.id, { excluded, excludedNote })}
          number={rep.number}
        />
      )}
    </>
  );
}

function LeaveOut({
  number,
  onClose,
  onChoose,
}: {
  number: number;
  onClose: () => void;
  onChoose: (reason: Exclusion, note: string) => Promise<unknown>;
}) {
  const [reason, setReason] = useState<Exclusion | null>(null);
  const [note, setNote] = useState('');
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const send = async () => {
    if (!reason) return;
    setBusy(true);
    setError(null);
    try {
      await onChoose(reason, note);
      onClose();
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <Dialog open title={`Leave rep ${number} out`} onClose={onClose}>
      <p className="mb-3">It stays visible, with its reason; the reading does without it.</p>
      <fieldset>
        <legend className="font-bold">Why</legend>
        {(Object.keys(EXCLUSION_WORDS) as Exclusion[]).map((each) => (
          <label key={each} className="flex min-h-[44px] items-center gap-3 border-b border-rule">
            <input
              type="radio"
              name="reason"
              className="size-5 accent-ink"
              checked={reason === each}
              onChange={() => setReason(each)}
            />
            {EXCLUSION_WORDS[each]}
          </label>
        ))}
      </fieldset>
      <label className="mt-4 block">
        <span className="font-bold">Note</span> <span className="text-soft">if you wish</span>
        <input
          className={FIELD_BOX}
          maxLength={300}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      </label>
      {error !== null && (
        <div className="mt-4">
          <ErrorState error={error} />
        </div>
      )}
      <div className="mt-6 flex flex-wrap gap-3">
        <Button look="primary" disabled={!reason} busy={busy} onClick={() => void send()}>
          Leave it out
        </Button>
        <Button onClick={onClose}>Keep it in</Button>
      </div>
    </Dialog>
  );
}
