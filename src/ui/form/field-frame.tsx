import { useId, type ReactNode } from 'react';

export type FieldWords = {
  label: ReactNode;
  /** What to write, before it is wrong. */
  hint?: ReactNode;
  /** Said beside the label of what may be left empty. */
  optional?: boolean;
};

export const FIELD_BOX =
  'mt-1 block w-full min-h-[44px] rounded border border-edge bg-sheet px-3 py-2 text-body text-ink aria-[invalid=true]:border-2 aria-[invalid=true]:border-alarm disabled:bg-transparent disabled:text-soft';

/** Ids that tie a control to its label, hint and fault. */
export function useFieldIds(hint: ReactNode, error: string | undefined) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-fault`;
  const described = [hint !== undefined && hintId, error !== undefined && errorId]
    .filter((part) => part !== false)
    .join(' ');
  return { id, hintId, errorId, describedBy: described === '' ? undefined : described };
}

export function Fault({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} className="mt-1 text-note font-bold text-alarm">
      {children}
    </p>
  );
}

/** Label above, control, hint, fault below. */
export function FieldFrame({
  ids,
  label,
  hint,
  optional = false,
  error,
  children,
}: FieldWords & {
  ids: ReturnType<typeof useFieldIds>;
  error?: string;
  children: ReactNode;
}) {
  return (
    <div>
      <label htmlFor={ids.id} className="font-bold">
        {label}
        {optional && <span className="font-normal text-soft"> if you like</span>}
      </label>
      {hint !== undefined && (
        <p id={ids.hintId} className="text-note text-soft">
          {hint}
        </p>
      )}
      {children}
      {error !== undefined && <Fault id={ids.errorId}>{error}</Fault>}
    </div>
  );
}
