import { useState, type ReactNode } from 'react';
import { Button, type ButtonLook } from './button.tsx';
import { Dialog } from './dialog.tsx';
import { ErrorState } from './states.tsx';

/** A button whose act cannot be taken back: it first says what will be lost, and asks. */
export function ConfirmButton({
  label,
  look = 'danger',
  className,
  title,
  children,
  confirm,
  onConfirm,
}: {
  label: ReactNode;
  look?: ButtonLook;
  className?: string;
  title: string;
  /** What the act does. */
  children: ReactNode;
  /** The words on the button that does it. */
  confirm: string;
  onConfirm: () => Promise<unknown>;
}) {
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const act = async () => {
    setBusy(true);
    setError(null);
    try {
      await onConfirm();
      setOpen(false);
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <>
      <Button look={look} className={className} onClick={() => setOpen(true)}>
        {label}
      </Button>
      <Dialog open={open} title={title} onClose={() => setOpen(false)}>
        {children}
        {error !== null && (
          <div className="mt-4">
            <ErrorState error={error} />
          </div>
        )}
        <div className="mt-6 flex flex-wrap gap-3">
          <Button look="danger" busy={busy} onClick={() => void act()}>
            {confirm}
          </Button>
          <Button onClick={() => setOpen(false)}>Keep it</Button>
        </div>
      </Dialog>
    </>
  );
}
