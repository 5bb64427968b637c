import type { Difference } from '#shared/protocol/figures.ts';

/** What a version changes against the one before. */
export function DifferenceList({ items }: { items: readonly Difference[] }) {
  return (
    <ul>
      {items.map(({ label, from, to }) => (
        <li key={label} className="py-1">
          {label}: {from} becomes <b>{to}</b>
        </li>
      ))}
    </ul>
  );
}
