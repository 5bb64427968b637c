import { get, useFormState } from 'react-hook-form';

/** The message at one field of the form around it. */
export function useFault(name: string): string | undefined {
  const { errors } = useFormState({ name });
  const fault: unknown = get(errors, name);
  if (typeof fault !== 'object' || fault === null) return undefined;
  return 'message' in fault && typeof fault.message === 'string' ? fault.message : undefined;
}
