import { useEffect, useId, useRef, type ReactNode } from 'react';

/**
 * A native modal dialog: Escape and the backdrop close it, the focus stays inside and returns to where it
 * was. `onClose` is called however it ends.
 */
export function Dialog({
  open,
  title,
  onClose,
  children,
}: {
  open: boolean;
  title: string;
  onClose: () => void;
  children: ReactNode;
}) {
  const ref = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (!open || dialog === null) return;
    const before = document.activeElement;
    dialog.showModal();
    return () => {
      dialog.close();
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, [open]);
  if (!open) return null;
  return (
    <dialog
      ref={ref}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === ref.current) onClose();
      }}
      className="m-auto w-[min(560px,calc(100vw-32px))] max-w-none rounded border border-ink bg-mud p-0 text-left text-body font-normal text-ink backdrop:bg-dusk/60"
    >
      <div className="p-5 tablet:p-7">
        <h2 id={titleId} tabIndex={-1} className="mb-3 text-filled font-bold">
          {title}
        </h2>
        {children}
      </div>
    </dialog>
  );
}
