import { useId, useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** Words in a thread: an answer, or one's own words changed. */
export function WordsForm({
  label,
  start = '',
  act,
  onSend,
  onDone,
}: {
  label: string;
  start?: string;
  /** The words on the button. */
  act: string;
  onSend: (body: string) => Promise<void>;
  onDone: () => void;
}) {
  const say = useStatus();
  const [body, setBody] = useState(start);
  const [busy, setBusy] = useState(false);
  const id = useId();
  const send = async () => {
    setBusy(true);
    try {
      await onSend(body);
      onDone();
    } catch (error) {
      say(error instanceof Error ? error.message : 'Your words were not sent.');
      setBusy(false);
    }
  };
  return (
    <div className="mt-1">
      <label htmlFor={id} className="font-bold">
        {label}
      </label>
      <textarea
        id={id}
        rows={2}
        maxLength={2000}
        className={FIELD_BOX}
        value={body}
        onChange={(event) => setBody(event.target.value)}
      />
      <div className="mt-2 flex gap-3">
        <Button busy={busy} disabled={body.trim() === ''} onClick={() => void send()}>
          {act}
        </Button>
        <Button look="plain" onClick={onDone}>
          Not now
        </Button>
      </div>
    </div>
  );
}
