import { filming as filmingSchema, type Visit } from '#shared/contracts/visits.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { LengthField } from '#src/ui/form/length-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';
import { useVisitEdit } from '../use-visit-edit.ts';
import { FILMING } from './filming-words.ts';

/** The figures by hand. An empty field is not known, and what needs it is not measured. */
export function FilmingForm({ visit, onDone }: { visit: Visit; onDone: () => void }) {
  const form = useZodForm(filmingSchema, visit.filming);
  const edit = useVisitEdit(visit);
  const say = useStatus();
  return (
    <Form
      form={form}
      className="mt-5"
      send={async (filming) => {
        await edit.mutateAsync({ filming });
        say('Saved. New clips take these figures; clips that are here keep theirs.');
        onDone();
      }}
    >
      <div className="grid max-w-form gap-5 phone:grid-cols-2">
        {FILMING.map(({ key, label, unit, hint }) => (
          <LengthField key={key} name={key} label={label} unit={unit} hint={hint} />
        ))}
      </div>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Saving …">
          Save the figures
        </Button>
        <Button look="plain" className="px-2" onClick={onDone}>
          Leave as they were
        </Button>
      </div>
    </Form>
  );
}
