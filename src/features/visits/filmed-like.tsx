import { useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import type * as z from 'zod';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Visit, visitBody, VisitRow } from '#shared/contracts/visits.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { shortDay } from '#src/ui/days.ts';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { VIEW_WORDS } from '#src/ui/words.ts';
import { FILMING, lengthWords } from './filming/filming-words.ts';

/** A retest is filmed as the visit that it is compared with: the same figures, and the same view. */
export function FilmedLike({
  earlier,
  form,
}: {
  earlier: readonly VisitRow[];
  form: UseFormReturn<z.input<typeof visitBody>, unknown, z.output<typeof visitBody>>;
}) {
  const id = useId();
  const like = useWatch({ control: form.control, name: 'likeVisitId' }) ?? '';
  const page = useQuery({ ...visitOptions(like), enabled: like !== '' });
  return (
    <div>
      <label htmlFor={id} className="font-bold">
        How it is filmed
      </label>
      <select
        id={id}
        className={FIELD_BOX}
        value={like}
        onChange={(event) =>
          form.setValue('likeVisitId', event.target.value === '' ? null : event.target.value)
        }
      >
        <option value="">With the practice’s usual set-up</option>
        {earlier.map((visit) => (
          <option key={visit.id} value={visit.id}>
            A retest, filmed as on {shortDay(visit.day)}
          </option>
        ))}
      </select>
      {page.data && (
        <p className="mt-2 text-note text-soft">
          {asFilmed(page.data)} Only what is filmed alike can be compared.
        </p>
      )}
    </div>
  );
}

const asFilmed = ({ visit, clips }: { visit: Visit; clips: readonly Clip[] }): string => {
  const known = FILMING.flatMap(({ key, label, unit }) => {
    const value = visit.filming[key];
    return value === null ? [] : [`${label.toLowerCase()} ${lengthWords(value, unit)}`];
  });
  const views = [...new Set(clips.map(({ view }) => VIEW_WORDS[view]))];
  const all = [...known, ...views];
  return all.length === 0
    ? 'Nothing was written down of how that visit was filmed.'
    : `As then: ${all.join(', ')}.`;
};
