import type { ReactNode } from 'react';
import type * as z from 'zod';
import { provenBody } from '#shared/contracts/one-time-codes.ts';
import { Button, type ButtonLook } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';

export type Proven = z.output<typeof provenBody>;

/** Asks for password and code before something about the codes is changed. */
export function ProveDialog({
  title,
  confirm,
  look = 'primary',
  onClose,
  onProven,
  children,
}: {
  title: string;
  confirm: string;
  look?: ButtonLook;
  onClose: () => void;
  onProven: (proven: Proven) => Promise<void>;
  /** What it does. */
  children: ReactNode;
}) {
  const form = useZodForm(provenBody, { password: '', code: '' });
  return (
    <Dialog open title={title} onClose={onClose}>
      {children}
      <Form form={form} send={onProven} className="mt-5 space-y-5">
        <TextField
          name="password"
          type="password"
          label="Your password"
          autoComplete="current-password"
        />
        <TextField
          name="code"
          label="Code"
          hint="Of your phone, or a recovery code."
          autoComplete="one-time-code"
        />
        <div className="flex flex-wrap gap-3">
          <Button
            type="submit"
            look={look}
            busy={form.formState.isSubmitting}
            busyLabel="One moment …"
          >
            {confirm}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </Form>
    </Dialog>
  );
}
