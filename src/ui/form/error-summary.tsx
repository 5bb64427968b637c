import type { ReactNode, Ref } from 'react';
import { useFormContext, useFormState } from 'react-hook-form';
import { useLabels } from './labels.tsx';

/** A label that is a question or a sentence needs no colon after it. */
const endsItself = (label: ReactNode) => typeof label === 'string' && /[.?!]$/.test(label);

/** Every `{ message }` in the tree of errors with its path. */
function flatten(errors: object, before = ''): { path: string; message: string }[] {
  return Object.entries(errors).flatMap(([name, value]: [string, unknown]) => {
    const path = before === '' ? name : `${before}.${name}`;
    if (typeof value !== 'object' || value === null || name === 'ref') return [];
    if ('message' in value && typeof value.message === 'string')
      return [{ path, message: value.message }];
    return flatten(value, path);
  });
}

/** What is wrong with the form, in one place; each line leads to its field. */
export function ErrorSummary({ ref }: { ref: Ref<HTMLDivElement> }) {
  const { setFocus } = useFormContext();
  const { errors } = useFormState();
  const labels = useLabels();
  const faults = flatten(errors);
  if (faults.length === 0) return null;
  const general = faults.filter(({ path }) => path === 'root');
  const atFields = faults.filter(({ path }) => path !== 'root');
  return (
    <div
      ref={ref}
      role="alert"
      tabIndex={-1}
      data-quiet-focus
      className="mb-6 border-l-[3px] border-alarm py-0.5 pl-3.5"
    >
      {general.map(({ message }) => (
        <p key={message}>{message}</p>
      ))}
      {atFields.length > 0 && (
        <>
          <p className="font-bold text-alarm">Before this can be sent:</p>
          <ul>
            {atFields.map(({ path, message }) => (
              <li key={path}>
                <button
                  type="button"
                  className="min-h-[32px] text-left underline underline-offset-[3px]"
                  onClick={() => setFocus(path)}
                >
                  {labels.has(path) && (
                    <>
                      {labels.get(path)}
                      {endsItself(labels.get(path)) ? ' ' : ': '}
                    </>
                  )}
                  {message}
                </button>
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  );
}
