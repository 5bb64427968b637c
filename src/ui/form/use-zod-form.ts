import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type DefaultValues, type FieldValues, type UseFormReturn } from 'react-hook-form';
import type * as z from 'zod';

/** A form that is checked by a contract before it is sent. Pass it to `Form`, whose summary takes the focus. */
export function useZodForm<In extends FieldValues, Out extends FieldValues>(
  schema: z.ZodType<Out, In>,
  defaultValues: DefaultValues<In>,
): UseFormReturn<In, unknown, Out> {
  return useForm<In, unknown, Out>({
    resolver: zodResolver(schema),
    defaultValues,
    shouldFocusError: false,
  });
}
