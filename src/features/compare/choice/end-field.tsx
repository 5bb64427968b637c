import { useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { sideReadingOptions } from '#src/api/readings.queries.ts';
import { shortDay } from '#src/ui/days.ts';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { type End, endOf, endText, chosenRep, playableReps } from '../ends.ts';
import type { MeasuredSide } from './suggestions.ts';

const sideText = ({ visitId, side }: End): string => endText({ visitId, side, repId: null });

/** One of the two: which visit and side, and which rep of it plays. */
export function EndField({
  label,
  sides,
  end,
  onChange,
}: {
  label: string;
  sides: readonly MeasuredSide[];
  end: End | null;
  onChange: (end: End) => void;
}) {
  const id = useId();
  const page = useQuery({
    ...sideReadingOptions(end?.visitId ?? '', end?.side ?? 'right'),
    enabled: end !== null,
  });
  const reps = page.data?.reading ? playableReps(page.data.reading) : [];
  const playing = chosenRep(reps, end?.repId ?? null);
  return (
    <fieldset className="space-y-3">
      <legend className="font-bold">{label}</legend>
      {/* side by side where the films below would be out of sight */}
      <div className="grid grid-cols-[minmax(0,3fr)_minmax(0,2fr)] gap-3 tablet:grid-cols-1">
        <div className="only:col-span-full">
          <label htmlFor={`${id}-side`} className="mb-1 block text-note text-soft">
            Visit and side
          </label>
          <select
            id={`${id}-side`}
            className={FIELD_BOX}
            value={end ? sideText(end) : ''}
            onChange={(event) => {
              const chosen = endOf(event.target.value);
              if (chosen) onChange(chosen);
            }}
          >
            {!end && <option value="">Choose</option>}
            {sides.map(({ end: each, day, label: says }) => (
              <option key={sideText(each)} value={sideText(each)}>
                {shortDay(day)}, standing on the {each.side}: {says}
              </option>
            ))}
          </select>
        </div>
        {end && reps.length > 1 && (
          <div>
            <label htmlFor={`${id}-rep`} className="mb-1 block text-note text-soft">
              Rep that plays
            </label>
            <select
              id={`${id}-rep`}
              className={FIELD_BOX}
              value={playing?.id ?? ''}
              onChange={(event) => onChange({ ...end, repId: event.target.value })}
            >
              {reps.map((rep) => (
                <option key={rep.id} value={rep.id}>
                  rep {rep.number} of {rep.clipName}
                  {rep.used ? '' : ', left out of the reading'}
                </option>
              ))}
            </select>
          </div>
        )}
      </div>
    </fieldset>
  );
}
