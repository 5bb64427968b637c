import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useId, useState } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { ErrorState } from '#src/ui/states.tsx';

type Part = { fromSeconds: number; toSeconds: number | null };

/** A refused clip of which a part can be used: what is there of a cut one, or the part that matters of a long one. */
export function UsePart({ clip, refusal }: { clip: Clip; refusal: NonNullable<Clip['refusal']> }) {
  const client = useQueryClient();
  const use = useMutation({
    mutationFn: (part: Part) => call(routes.usePart, { params: { id: clip.id }, body: part }),
    onSuccess: () =>
      client.invalidateQueries({ queryKey: visitOptions(clip.visitId).queryKey, exact: true }),
  });
  const { usablePartSeconds: usable, code } = refusal;
  return (
    <>
      {usable !== null && code !== 'too-long' && (
        <Button
          className="mt-2"
          busy={use.isPending}
          onClick={() => use.mutate({ fromSeconds: 0, toSeconds: null })}
        >
          Use the {usable.toFixed(1)} s that are there
        </Button>
      )}
      {code === 'too-long' && (
        <PartChoice busy={use.isPending} onChoose={(part) => use.mutate(part)} />
      )}
      {use.isError && (
        <div className="mt-3">
          <ErrorState error={use.error} />
        </div>
      )}
    </>
  );
}

function PartChoice({ busy, onChoose }: { busy: boolean; onChoose: (part: Part) => void }) {
  const id = useId();
  const [from, setFrom] = useState('0');
  const [to, setTo] = useState('');
  const read = (text: string) => (text.trim() === '' ? NaN : Number(text.replace(',', '.')));
  const valid = read(from) >= 0 && read(to) > read(from);
  return (
    <div className="mt-2 flex flex-wrap items-end gap-3">
      {(
        [
          ['from', 'From, s', from, setFrom],
          ['to', 'To, s', to, setTo],
        ] as const
      ).map(([name, label, value, set]) => (
        <div key={name}>
          <label htmlFor={`${id}-${name}`} className="text-note">
            {label}
          </label>
          <input
            id={`${id}-${name}`}
            inputMode="decimal"
            autoComplete="off"
            value={value}
            onChange={(event) => set(event.target.value)}
            className={`${FIELD_BOX} !w-[6em]`}
          />
        </div>
      ))}
      <Button
        disabled={!valid}
        busy={busy}
        onClick={() => onChoose({ fromSeconds: read(from), toSeconds: read(to) })}
      >
        Use this part
      </Button>
    </div>
  );
}
