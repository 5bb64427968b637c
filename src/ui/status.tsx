import {
  createContext,
  useCallback,
  useContext,
  useMemo,
  useRef,
  useState,
  type ReactNode,
} from 'react';
import { Button } from './button.tsx';

type Message = {
  text: string;
  /** Offered beside the words, such as an undo. */
  action?: { label: string; run: () => void };
};
type Say = (text: string, action?: Message['action']) => void;

const StatusContext = createContext<Say>(() => undefined);

/** Says a short thing that happened ("Saved."), seen and heard. It takes no focus and covers no control. */
export const useStatus = (): Say => useContext(StatusContext);

const SHOWN_MS = 8_000;

export function StatusProvider({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState<Message | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const hold = useCallback(() => clearTimeout(timer.current), []);
  const release = useCallback(() => {
    clearTimeout(timer.current);
    timer.current = setTimeout(() => setMessage(null), SHOWN_MS);
  }, []);
  const say = useCallback<Say>(
    (text, action) => {
      setMessage({ text, action });
      release();
    },
    [release],
  );
  const context = useMemo(() => say, [say]);
  return (
    <StatusContext value={context}>
      {children}
      {/* the region is always there: a reader hears only what changes inside it */}
      <div
        role="status"
        className="pointer-events-none fixed inset-x-0 bottom-0 z-40 flex justify-center p-4"
        onMouseEnter={hold}
        onMouseLeave={release}
        onFocus={hold}
        onBlur={release}
      >
        {message !== null && (
          <div className="pointer-events-auto flex max-w-form flex-wrap items-center gap-x-6 rounded bg-ink px-5 text-mud">
            <p className="py-3">{message.text}</p>
            {message.action && (
              <Button
                look="plain"
                className="!text-mud"
                onClick={() => {
                  message.action?.run();
                  setMessage(null);
                }}
              >
                {message.action.label}
              </Button>
            )}
          </div>
        )}
      </div>
    </StatusContext>
  );
}
