import { liveEvent, type LiveEvent } from '#shared/contracts/events.ts';

type Listener = {
  onEvent: (event: LiveEvent) => void;
  /** The stream is open again after a break: what happened meanwhile may have been missed. */
  onResume: () => void;
};

const TYPES = [
  'clip',
  'marks',
  'comments',
  'reading',
  'plan',
  'report',
  'consent',
  'signed-out',
] as const satisfies readonly LiveEvent['type'][];

const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 60_000;

/**
 * Opens the tab's one stream of events and keeps it open: browsers give up for good on an answer other
 * than 200, so after such an end it is opened anew with growing pauses. Returns how to close it.
 */
export function openLiveEvents({ onEvent, onResume }: Listener): () => void {
  let source: EventSource | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let wait = FIRST_WAIT_MS;
  let broken = false;

  const receive = (message: MessageEvent<string>) => {
    const read = liveEvent.safeParse(parsed(message.data));
    if (read.success) onEvent(read.data);
  };
  const open = () => {
    source = new EventSource('/api/events');
    source.onopen = () => {
      wait = FIRST_WAIT_MS;
      if (broken) onResume();
      broken = false;
    };
    source.onerror = () => {
      broken = true;
      if (source?.readyState !== EventSource.CLOSED) return;
      timer = setTimeout(open, wait);
      wait = Math.min(wait * 2, LONGEST_WAIT_MS);
    };
    source.onmessage = receive;
    for (const type of TYPES) source.addEventListener(type, receive);
  };
  open();
  return () => {
    clearTimeout(timer);
    source?.close();
  };
}

function parsed(data: string): unknown {
  try {
    return JSON.parse(data);
  } catch {
    return null;
  }
}
