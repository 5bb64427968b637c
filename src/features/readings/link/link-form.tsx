import { useQuery, useQueryClient } from '@tanstack/react-query';
import * as z from 'zod';
import type { SidePage } from '#shared/contracts/readings.ts';
import { replayBody } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { VisitRow } from '#shared/contracts/visits.ts';
import { athleteVisitsOptions } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { replaysOptions } from '#src/api/readings.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { longDay } from '#src/ui/days.ts';
import { CheckboxField } from '#src/ui/form/choice-fields.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { type Option, SelectField, TextArea, TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import type { NamedRep } from '../side-clips.ts';
import { DaysField } from './days-field.tsx';
import type { MadeLink } from './link-address.tsx';
import { repChoice } from './rep-choice.ts';
import { SpanFields } from './span-fields.tsx';

const frame = z.int('Write the number of a frame.').min(0, 'The first frame is 0.');
const formBody = replayBody
  .omit({ visitId: true, side: true })
  // the empty choice of the list is none
  .extend({ fromFrame: frame, toFrame: frame, beforeVisitId: z.string() })
  .refine(({ fromFrame, toFrame }) => toFrame > fromFrame, {
    path: ['toFrame'],
    message: 'The last frame comes after the first.',
  });

/** `onMade` gets the address too; it is in no later answer. */
export function LinkForm({
  page,
  reps,
  onMade,
}: {
  page: SidePage;
  reps: readonly NamedRep[];
  onMade: (made: MadeLink) => void;
}) {
  const client = useQueryClient();
  // without the list the link is made all the same
  const visits = useQuery({ ...athleteVisitsOptions(page.athlete.id), throwOnError: false });
  const earlier = earlierVisits(page, visits.data?.items ?? []);
  const measured = page.reading !== null;
  const first = preferred(page, reps);
  const form = useZodForm(formBody, {
    repId: first?.rep.id ?? '',
    fromFrame: first?.rep.startFrame ?? 0,
    toFrame: first?.rep.endFrame ?? 0,
    beforeVisitId: '',
    message: '',
    days: 30,
    passPhrase: null,
    showReading: measured,
    showCall: true,
    hideHead: false,
  });
  const send = async (body: z.output<typeof formBody>) => {
    const made = await call(routes.makeReplay, {
      body: {
        ...body,
        beforeVisitId: body.beforeVisitId === '' ? null : body.beforeVisitId,
        visitId: page.visit.id,
        side: page.side,
      },
    });
    void client.invalidateQueries({ queryKey: replaysOptions(page.visit.id).queryKey });
    onMade(made);
  };
  return (
    <Form form={form} send={send} className="max-w-form space-y-5">
      <div className="grid gap-5 phone:grid-cols-2">
        <SelectField
          name="repId"
          label="Rep that is played"
          options={reps.map((named) => ({
            value: named.rep.id,
            label: repChoice(named, new Set(reps.map(({ clip }) => clip.id)).size > 1),
          }))}
        />
        <DaysField />
      </div>
      <SpanFields reps={reps} />
      {earlier.length > 0 && (
        <SelectField
          name="beforeVisitId"
          label="Beside an earlier lift"
          hint={`Standing on the ${page.side} too; both stand still at the same height of the thigh.`}
          options={[{ value: '', label: 'none' }, ...earlier]}
        />
      )}
      <TextArea
        name="message"
        label={`A sentence of your own to ${page.athlete.name}`}
        hint="In words a person without training understands."
        optional
      />
      <TextField
        name="passPhrase"
        label="Pass phrase"
        hint="At least 6 characters, asked before anything is shown. It cannot be looked up later."
        optional
        emptyIsNull
      />
      <div>
        {measured && (
          <CheckboxField
            name="showReading"
            label="Show the measured reading"
            note={
              page.reading?.provisional
                ? 'It is provisional: the link shows it once the tracked marks have been looked at.'
                : undefined
            }
          />
        )}
        <CheckboxField
          name="showCall"
          label="Show the call by eye"
          note="Labelled: seen by your coach, not measured."
        />
        <CheckboxField
          name="hideHead"
          label="Hide the head"
          note="The film that leaves has a mosaic over the head. Draw a box around the head on the Bench and look through it first. This does not make the film anonymous: clothes, room, tattoos and the way of moving remain."
        />
      </div>
      <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Making the link…">
        Make a link
      </Button>
    </Form>
  );
}

/** Visits before this one at which the same side was measured. */
const earlierVisits = ({ visit, side }: SidePage, visits: readonly VisitRow[]): Option[] =>
  visits.flatMap(({ id, day, sides }) =>
    day < visit.day && sides.some((each) => each.side === side && each.reading !== null)
      ? [{ value: id, label: longDay(day) }]
      : [],
  );

/** A rep that counts in the reading rather than one that was left out. */
const preferred = ({ reading }: SidePage, reps: readonly NamedRep[]): NamedRep | undefined => {
  const used = new Set(reading?.result.reps.filter((rep) => rep.used).map(({ id }) => id));
  return (
    reps.find(({ rep }) => used.has(rep.id)) ??
    reps.find(({ rep }) => rep.excluded === null) ??
    reps[0]
  );
};
