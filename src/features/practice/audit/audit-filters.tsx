import { useId } from 'react';
import { AUDIT_ACTIONS, AUDITED_ACTIONS } from '#shared/contracts/audit-actions.ts';
import type { AuditNames } from '#shared/contracts/audit.ts';
import { today } from '#src/ui/days.ts';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import type { AuditField } from './audit-address.ts';

const ACTIONS = AUDITED_ACTIONS.map((action) => ({
  value: action,
  label: AUDIT_ACTIONS[action][1],
})).sort((a, b) => a.label.localeCompare(b.label, 'en'));

/** Enough of an id to tell two athletes apart whose names are gone. */
const goneName = (id: string) => `Athlete no longer here (${id.slice(0, 8)})`;

/** Who, whom, what and when; each change is in the address at once. */
export function AuditFilters({
  search,
  names,
  onChange,
}: {
  search: URLSearchParams;
  /** Undefined while they load. */
  names: AuditNames | undefined;
  onChange: (field: AuditField, value: string) => void;
}) {
  const id = useId();
  const people = names?.people.map(({ id: value, name: label }) => ({ value, label })) ?? [];
  const athletes =
    names?.athletes.map(({ id: value, name }) => ({ value, label: name ?? goneName(value) })) ?? [];
  const lists = [
    ['person', 'Who', 'Anybody', people],
    ['athlete', 'Athlete', 'Any athlete', athletes],
    ['action', 'What', 'Anything', ACTIONS],
  ] as const;
  return (
    <search className="grid grid-cols-2 gap-4 desk:grid-cols-[1fr_1fr_1.4fr_170px_170px]">
      {lists.map(([field, label, any, options]) => (
        <div
          key={field}
          className={`col-span-2 desk:col-span-1 ${field === 'action' ? '' : 'phone:col-span-1'}`}
        >
          <label htmlFor={`${id}-${field}`} className="font-bold">
            {label}
          </label>
          <select
            id={`${id}-${field}`}
            value={search.get(field) ?? ''}
            onChange={(event) => onChange(field, event.target.value)}
            className={FIELD_BOX}
          >
            <option value="">{any}</option>
            {options.map(({ value, label: words }) => (
              <option key={value} value={value}>
                {words}
              </option>
            ))}
          </select>
        </div>
      ))}
      {(['from', 'to'] as const).map((field) => (
        <div key={field}>
          <label htmlFor={`${id}-${field}`} className="font-bold">
            {field === 'from' ? 'From' : 'Up to and with'}
          </label>
          <input
            id={`${id}-${field}`}
            type="date"
            max={today()}
            value={search.get(field) ?? ''}
            onChange={(event) => onChange(field, event.target.value)}
            className={FIELD_BOX}
          />
        </div>
      ))}
    </search>
  );
}
