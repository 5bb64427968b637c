import { Button } from '#src/ui/button.tsx';
import type { Pictures } from './use-pictures.ts';

/** Over the picture while there is none, and where there will be none. */
export function PictureState({ pictures }: { pictures: Pictures }) {
  const { error, shown, loaded, retry } = pictures;
  if (error)
    return (
      <div
        role="alert"
        // presses belong to the words here, not to the stage below
        onPointerDown={(event) => event.stopPropagation()}
        className="absolute inset-x-4 top-1/3 rounded bg-mud p-4 text-ink"
      >
        <p className="mb-3">{error.message}</p>
        <Button onClick={retry}>Try again</Button>
      </div>
    );
  if (shown !== null) return null;
  return (
    <p role="status" className="absolute inset-x-0 top-1/2 text-center text-note text-dusk-soft">
      {loaded > 0 && loaded < 1
        ? `Loading the clip, ${Math.round(loaded * 100)} %`
        : 'Loading the clip'}
    </p>
  );
}
