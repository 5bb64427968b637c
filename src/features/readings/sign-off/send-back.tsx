import * as z from 'zod';
import { text } from '#shared/contracts/primitives.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextArea } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';

const shape = z.object({ reason: text(1000) });

/** Why it goes back: the coach reads it first thing in Today. */
export function SendBack({
  onSend,
  onLeave,
}: {
  onSend: (reason: string) => Promise<void>;
  onLeave: () => void;
}) {
  const form = useZodForm(shape, { reason: '' });
  return (
    <Form form={form} send={({ reason }) => onSend(reason)} className="mt-5">
      <TextArea
        name="reason"
        label="What is to be mended?"
        hint="The coach reads it in Today. Name the frame or the landmark where you can."
        rows={3}
      />
      <div className="mt-4 flex flex-wrap gap-3">
        <Button look="primary" type="submit" busy={form.formState.isSubmitting}>
          Send back
        </Button>
        <Button onClick={onLeave}>Not now</Button>
      </div>
    </Form>
  );
}
