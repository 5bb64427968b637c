import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { openLiveEvents } from './live-events.ts';

class FakeSource extends EventTarget {
  static readonly CLOSED = 2;
  static opened: FakeSource[] = [];
  readyState = 0;
  onopen: (() => void) | null = null;
  onerror: (() => void) | null = null;
  onmessage: ((event: MessageEvent) => void) | null = null;
  closed = false;
  constructor(readonly url: string) {
    super();
    FakeSource.opened.push(this);
  }
  close() {
    this.closed = true;
  }
  say(type: string, data: string) {
    this.dispatchEvent(new MessageEvent(type, { data }));
  }
  end() {
    this.readyState = FakeSource.CLOSED;
    this.onerror?.();
  }
}

beforeEach(() => {
  FakeSource.opened = [];
  vi.stubGlobal('EventSource', FakeSource);
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

const opened = () => {
  const onEvent = vi.fn();
  const onResume = vi.fn();
  const close = openLiveEvents({ onEvent, onResume });
  const newest = () => FakeSource.opened.at(-1);
  return { onEvent, onResume, close, newest };
};

describe('openLiveEvents', () => {
  it('hands on what fits the contract and nothing else', () => {
    const { onEvent, newest } = opened();
    newest()?.say('signed-out', '{"type":"signed-out"}');
    newest()?.say('clip', '{"type":"clip"}');
    newest()?.say('marks', 'no JSON');
    expect(onEvent.mock.calls).toEqual([[{ type: 'signed-out' }]]);
  });

  it('opens anew after an end that the browser takes as final, with growing pauses', () => {
    const { newest } = opened();
    newest()?.end();
    expect(FakeSource.opened).toHaveLength(1);
    vi.advanceTimersByTime(2_000);
    expect(FakeSource.opened).toHaveLength(2);
    newest()?.end();
    vi.advanceTimersByTime(2_000);
    expect(FakeSource.opened).toHaveLength(2);
    vi.advanceTimersByTime(2_000);
    expect(FakeSource.opened).toHaveLength(3);
  });

  it('says that something may have been missed, but not at the first opening', () => {
    const { onResume, newest } = opened();
    newest()?.onopen?.();
    expect(onResume).not.toHaveBeenCalled();
    newest()?.end();
    vi.advanceTimersByTime(2_000);
    newest()?.onopen?.();
    expect(onResume).toHaveBeenCalledTimes(1);
  });

  it('closes for good', () => {
    const { close, newest } = opened();
    newest()?.end();
    close();
    vi.advanceTimersByTime(120_000);
    expect(FakeSource.opened).toHaveLength(1);
    expect(newest()?.closed).toBe(true);
  });
});
