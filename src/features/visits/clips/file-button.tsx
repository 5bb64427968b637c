import { useRef, type ReactNode } from 'react';
import { Button, type ButtonLook } from '#src/ui/button.tsx';

/** What phones call a video is told by its type, sometimes only by its name. */
const VIDEO = 'video/*,.mov,.mp4,.m4v,.webm';

/** Opens the device's own choice of files, or its camera. */
export function FileButton({
  look,
  record = false,
  multiple = false,
  onFiles,
  children,
}: {
  look?: ButtonLook;
  /** The back camera instead of the files, where the device has one. */
  record?: boolean;
  multiple?: boolean;
  onFiles: (files: readonly File[]) => void;
  children: ReactNode;
}) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <Button look={look} onClick={() => input.current?.click()}>
        {children}
      </Button>
      <input
        ref={input}
        type="file"
        accept={VIDEO}
        multiple={multiple}
        capture={record ? 'environment' : undefined}
        tabIndex={-1}
        aria-hidden="true"
        className="sr-only"
        onChange={(event) => {
          onFiles([...(event.target.files ?? [])]);
          // the same file can be chosen again
          event.target.value = '';
        }}
      />
    </>
  );
}
