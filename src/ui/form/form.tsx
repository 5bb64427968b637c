import { useEffect, useRef, useState, type ReactNode } from 'react';
import {
  FormProvider,
  type FieldPath,
  type FieldValues,
  type UseFormReturn,
} from 'react-hook-form';
import { refusalOf } from './refusal.ts';
import { ErrorSummary } from './error-summary.tsx';
import { LabelsProvider } from './labels.tsx';

/**
 * A form that checks by its contract before sending, sends, and shows what the server says: faults at their
 * fields, the rest at the top. The summary takes the focus when something is wrong.
 */
export function Form<In extends FieldValues, Out>({
  form,
  send,
  className,
  children,
}: {
  form: UseFormReturn<In, unknown, Out>;
  /** Throws what the server refused. */
  send: (values: Out) => Promise<unknown>;
  className?: string;
  children: ReactNode;
}) {
  const summary = useRef<HTMLDivElement>(null);
  const [attempt, setAttempt] = useState(0);

  // counted only after a failed attempt, so that the summary is on the page when it gets the focus
  useEffect(() => {
    if (attempt > 0) summary.current?.focus();
  }, [attempt]);

  const submit = async (values: Out) => {
    try {
      await send(values);
    } catch (error) {
      const { general, atFields } = refusalOf(error, Object.keys(form.getValues()));
      for (const { path, message } of atFields)
        form.setError(path as FieldPath<In>, { type: 'server', message });
      if (general !== null) form.setError('root', { type: 'server', message: general });
      setAttempt((n) => n + 1);
    }
  };
  return (
    <FormProvider {...form}>
      <LabelsProvider>
        <form
          noValidate
          className={className}
          onSubmit={(event) =>
            void form.handleSubmit(submit, () => setAttempt((n) => n + 1))(event)
          }
        >
          <ErrorSummary ref={summary} />
          {children}
        </form>
      </LabelsProvider>
    </FormProvider>
  );
}
