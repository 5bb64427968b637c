import { useState, type DragEvent } from 'react';
import { cx } from '#src/ui/class-names.ts';
import { FileButton } from './file-button.tsx';

/** Drop, choose or record. The buttons do the same as dropping, so nobody needs to drag. */
export function DropZone({
  primary,
  onFiles,
}: {
  /** Nothing else on the page is more pressing. */
  primary: boolean;
  onFiles: (files: readonly File[]) => void;
}) {
  const [over, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    onFiles([...event.dataTransfer.files]);
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={cx(
        'flex flex-wrap items-center justify-between gap-x-6 gap-y-4 rounded border-[1.5px] border-dashed p-5 tablet:p-7',
        over ? 'border-ink bg-sheet' : 'border-edge',
      )}
    >
      <div className="max-w-lead">
        <p className="font-bold">Drop clips here, choose them, or record now</p>
        <p className="text-soft">
          Several at once; one take may hold both sides. Each is looked at on this device before it
          is sent, and goes on where it stopped.
        </p>
      </div>
      <div className="flex flex-wrap gap-3">
        <FileButton multiple onFiles={onFiles}>
          Choose files
        </FileButton>
        <FileButton record look={primary ? 'primary' : 'secondary'} onFiles={onFiles}>
          Record
        </FileButton>
      </div>
    </div>
  );
}
