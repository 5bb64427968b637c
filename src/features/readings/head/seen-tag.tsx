/** The frame that keeps what was seen apart from what was measured. */
export function SeenTag({ by = 'short' }: { by?: 'short' | 'coach' }) {
  return (
    <span className="whitespace-nowrap rounded border border-ink px-2 py-0.5 text-caption text-ink">
      {by === 'coach' ? 'seen by the coach, not measured' : 'seen, not measured'}
    </span>
  );
}
