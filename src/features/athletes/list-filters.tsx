import { useEffect, useId, useRef } from 'react';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import type { ListField } from './list-address.ts';

const CONSENT = [
  { value: '', label: 'Any' },
  { value: 'valid', label: 'Valid' },
  { value: 'none', label: 'Missing or lapsed' },
];
const SORT = [
  { value: '', label: 'Name' },
  { value: '-name', label: 'Name, from Z' },
  { value: '-lastVisit', label: 'Latest visit first' },
  { value: 'lastVisit', label: 'Longest without a visit first' },
];

/** A pause in typing before the list is asked for. */
const TYPING_MS = 250;

export function ListFilters({
  search,
  coaches,
  onChange,
}: {
  search: URLSearchParams;
  /** Whose athletes are in sight; with fewer than two there is nothing to choose. */
  coaches: readonly { readonly id: string; readonly name: string }[];
  onChange: (field: ListField, value: string) => void;
}) {
  const id = useId();
  const byCoach = coaches.length > 1 || search.has('coach');
  const chosen = search.get('coach');
  const COACH = [
    { value: '', label: 'Any' },
    ...coaches.map(({ id: value, name: label }) => ({ value, label })),
    // the address names a coach who has no athlete in sight
    ...(chosen !== null && !coaches.some((coach) => coach.id === chosen)
      ? [{ value: chosen, label: 'Another coach' }]
      : []),
  ];
  return (
    <search
      className={`grid gap-4 phone:grid-cols-2 ${
        byCoach
          ? 'tablet:grid-cols-2 desk:grid-cols-[minmax(0,1fr)_200px_190px_250px]'
          : 'tablet:grid-cols-[minmax(0,1fr)_200px_260px]'
      }`}
    >
      <div className={byCoach ? undefined : 'phone:col-span-2 tablet:col-span-1'}>
        <SearchBox value={search.get('q') ?? ''} onChange={(value) => onChange('q', value)} />
      </div>
      {(
        [
          ...(byCoach ? [['coach', 'Coach', COACH] as const] : []),
          ['consent', 'Consent', CONSENT],
          ['sort', 'Order', SORT],
        ] as const
      ).map(([field, label, options]) => (
        <div key={field}>
          <label htmlFor={`${id}-${field}`} className="font-bold">
            {label}
          </label>
          <select
            id={`${id}-${field}`}
            value={search.get(field) ?? ''}
            onChange={(event) => onChange(field, event.target.value)}
            className={FIELD_BOX}
          >
            {options.map(({ value, label: words }) => (
              <option key={value} value={value}>
                {words}
              </option>
            ))}
          </select>
        </div>
      ))}
    </search>
  );
}

function SearchBox({ value, onChange }: { value: string; onChange: (value: string) => void }) {
  const id = useId();
  const box = useRef<HTMLInputElement>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  // the browser's back button changes the search too; what is being typed is left alone
  useEffect(() => {
    if (box.current !== null && document.activeElement !== box.current) box.current.value = value;
  }, [value]);
  useEffect(() => () => clearTimeout(timer.current), []);
  return (
    <>
      <label htmlFor={id} className="font-bold">
        Name or sport
      </label>
      <input
        ref={box}
        id={id}
        type="search"
        autoComplete="off"
        maxLength={80}
        defaultValue={value}
        onChange={(event) => {
          const typed = event.target.value.trim();
          clearTimeout(timer.current);
          timer.current = setTimeout(() => onChange(typed), TYPING_MS);
        }}
        className={FIELD_BOX}
      />
    </>
  );
}
