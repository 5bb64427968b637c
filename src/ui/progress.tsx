/** How far something is, 0–100; null where that is not known. The words beside it give the number. */
export function Progress({ percent, label }: { percent: number | null; label: string }) {
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent === null ? undefined : Math.round(percent)}
      className="mt-2.5 h-1 overflow-hidden rounded bg-rule"
    >
      <div className="h-full bg-ink" style={{ width: `${percent ?? 0}%` }} />
    </div>
  );
}
