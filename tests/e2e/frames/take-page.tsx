import { createRoot } from 'react-dom/client';
import { MemoryRouter } from 'react-router-dom';
import { TakeLookState } from '#src/features/visits/clips/take-look.tsx';
import type { TakeLook } from '#src/tracking/take/look-at-take.ts';
import type { TakeAsked } from '#src/tracking/worker/take.worker.ts';
import { lookInWorker } from '#src/tracking/worker/look-in-worker.ts';
import { frameTimes, type TickTable } from '#src/video/frame-times.ts';

document.body.innerHTML = '<input type="file" aria-label="Film"><main></main>';
const root = createRoot(document.querySelector('main') ?? document.body);
const show = (look: TakeLook | undefined, failed = false): void =>
  root.render(
    <MemoryRouter>
      <TakeLookState
        name="film"
        looked={{ look, failed, rest: 'open', lookAtRest: () => undefined }}
        asksPointers={false}
      />
    </MemoryRouter>,
  );

const takes = {
  async look(asked: TakeAsked, signal = new AbortController().signal): Promise<void> {
    show(undefined);
    try {
      show(await lookInWorker(asked, signal));
    } catch {
      show(undefined, true);
    }
  },
  lookAtCopy: (url: string, table: TickTable): Promise<void> =>
    takes.look({
      clip: { url: new URL(url, location.href).href, frameTable: frameTimes(table) },
      reach: 'quick',
    }),
  async takenAway(file: File): Promise<string> {
    const away = new AbortController();
    const looking = lookInWorker({ file, reach: 'quick' }, away.signal);
    setTimeout(() => away.abort(), 50);
    return looking.then(
      () => 'told all the same',
      (error: unknown) => (error instanceof Error ? error.name : String(error)),
    );
  },
};

const input = document.querySelector('input');
input?.addEventListener('change', () => {
  const [file] = input.files ?? [];
  if (file) void takes.look({ file, reach: 'quick' });
});

declare global {
  interface Window {
    takes: typeof takes;
  }
}
window.takes = takes;
