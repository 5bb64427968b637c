import { useBench } from '../bench-context.ts';
import type { Act } from '../keys/key-map.ts';
import { useActs } from '../keys/use-acts.ts';

const BUTTONS: readonly { act: Act; sign: string; name: string }[] = [
  { act: 'zoom-in', sign: '+', name: 'Enlarge' },
  { act: 'zoom-out', sign: '−', name: 'Make smaller' },
  { act: 'zoom-whole', sign: 'whole', name: 'Whole picture' },
  { act: 'move-picture', sign: 'move', name: 'Move the picture instead of placing' },
];

/** In the corner of the clip: enlarge, make smaller, the whole picture, move instead of place. */
export function ZoomButtons() {
  const acts = useActs();
  const moving = useBench((state) => state.tool.kind === 'look');
  return (
    <div
      className="absolute bottom-2 right-2 flex rounded bg-dusk/80"
      // presses here are not for the stage below
      onPointerDown={(event) => event.stopPropagation()}
    >
      {BUTTONS.map(({ act, sign, name }) => (
        <button
          key={act}
          type="button"
          aria-label={name}
          aria-pressed={act === 'move-picture' ? moving : undefined}
          title={name}
          onClick={() => acts[act]?.()}
          className={`min-h-[44px] min-w-[36px] rounded px-1.5 text-caption text-dusk-ink ${
            act === 'move-picture' && moving ? 'bg-dusk-ink !text-dusk' : ''
          }`}
        >
          {sign}
        </button>
      ))}
    </div>
  );
}
