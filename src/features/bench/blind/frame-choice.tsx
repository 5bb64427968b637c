import type { Gates } from '#shared/protocol/protocol.ts';

/** Frames that the product chooses, or frames chosen by hand among the marked ones. */
export function FrameChoice({
  marked,
  chosen,
  gates,
  onChoose,
}: {
  marked: readonly number[];
  /** Null: the product chooses. */
  chosen: readonly number[] | null;
  gates: Gates;
  onChoose: (frames: readonly number[] | null) => void;
}) {
  const toggle = (frame: number) =>
    onChoose(
      chosen?.includes(frame)
        ? chosen.filter((each) => each !== frame)
        : [...(chosen ?? []), frame],
    );
  const radio = 'flex min-h-[44px] items-center gap-3 border-b border-rule';
  return (
    <fieldset>
      <legend className="font-bold">Which frames</legend>
      <label className={radio}>
        <input
          type="radio"
          name="frames"
          className="size-5 flex-none accent-ink"
          checked={chosen === null}
          onChange={() => onChoose(null)}
        />
        Ten, spread over the quiet stance, near {gates.from}° and near {gates.to}°
      </label>
      <label className={radio}>
        <input
          type="radio"
          name="frames"
          className="size-5 flex-none accent-ink"
          checked={chosen !== null}
          onChange={() => onChoose([])}
        />
        Frames that I choose
      </label>
      {chosen !== null && (
        <ul
          aria-label="Marked frames"
          className="mt-2 flex max-h-48 flex-wrap gap-1 overflow-y-auto"
        >
          {marked.map((frame) => (
            <li key={frame}>
              <label className="flex min-h-[44px] min-w-[76px] items-center gap-2 rounded border border-edge px-2">
                <input
                  type="checkbox"
                  className="size-5 flex-none accent-ink"
                  checked={chosen.includes(frame)}
                  onChange={() => toggle(frame)}
                />
                {frame}
              </label>
            </li>
          ))}
        </ul>
      )}
    </fieldset>
  );
}
