import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ApiProblem } from '#src/api/problem.ts';
import { keptUploads } from './kept-uploads.ts';
import type { TransferListener } from './transfer.ts';
import { createUploader, type UploaderParts } from './uploader.ts';

const front = { view: 'front' as const, supportSide: null, mirrored: false };
const file = (name: string, content = name) => new File([content], name);

/** Every transfer that was started, to be driven by hand. */
type Running = TransferListener & { file: File; url: string; stopped: boolean };

function setUp(change: Partial<UploaderParts> = {}) {
  const running: Running[] = [];
  const retries: (() => void)[] = [];
  let opened = 0;
  let clock = 0;
  const giveUp = vi.fn(() => Promise.resolve());
  const uploader = createUploader({
    lookAt: () => Promise.resolve({ outcome: 'not-a-video', advice: 'x' }),
    print: (chosen) => chosen.text(),
    open: () => {
      opened += 1;
      return Promise.resolve({ id: `u${opened}`, uploadUrl: `/api/uploads/u${opened}` });
    },
    giveUp,
    becameClip: () => Promise.resolve(false),
    startTransfer: (sent, url, listener) => {
      const one: Running = { ...listener, file: sent, url, stopped: false };
      running.push(one);
      return () => void (one.stopped = true);
    },
    now: () => (clock += 1000),
    whenOnline: (run) => {
      retries.push(run);
      return () => void retries.splice(retries.indexOf(run), 1);
    },
    ...change,
  });
  const items = () => uploader.store.getState().items;
  const phases = () => items().map(({ phase }) => phase);
  const settle = () => vi.waitFor(() => expect(running.length).toBeGreaterThan(0));
  return { uploader, running, retries, giveUp, items, phases, settle, opened: () => opened };
}

beforeEach(() => localStorage.clear());

describe('the uploader', () => {
  it('looks first, and sends only when told to', async () => {
    const { uploader, items, opened } = setUp();
    await uploader.add('v1', file('a.mov'), front);
    expect(items()[0]).toMatchObject({ phase: 'chosen', print: 'a.mov', look: { advice: 'x' } });
    expect(opened()).toBe(0);
  });

  it('does not send a side view before it knows the leg stood on', async () => {
    const { uploader, phases, items, settle } = setUp();
    await uploader.add('v1', file('a.mov'), { ...front, view: 'lifted-side' });
    const key = items()[0]?.key ?? '';
    uploader.send(key);
    expect(phases()).toEqual(['chosen']);
    uploader.describe(key, { supportSide: 'left' });
    uploader.send(key);
    await settle();
    expect(phases()).toEqual(['sending']);
  });

  it('sends three at once and the fourth when one is there', async () => {
    const { uploader, running, phases, items } = setUp();
    for (const name of ['a', 'b', 'c', 'd']) await uploader.add('v1', file(name), front);
    for (const { key } of items()) uploader.send(key);
    await vi.waitFor(() => expect(running).toHaveLength(3));
    expect(phases()).toEqual(['sending', 'sending', 'sending', 'queued']);
    running[0]?.onDone();
    await vi.waitFor(() => expect(running).toHaveLength(4));
    expect(phases()).toEqual(['sent', 'sending', 'sending', 'sending']);
  });

  it('tells the rest of the page when a clip is there', async () => {
    const { uploader, running, items, settle } = setUp();
    const sent = vi.fn();
    uploader.onSent(sent);
    await uploader.add('v1', file('a'), front);
    uploader.send(items()[0]?.key ?? '');
    await settle();
    running[0]?.onProgress(1);
    running[0]?.onDone();
    expect(sent.mock.calls[0]?.[0]).toMatchObject({ uploadId: 'u1', visitId: 'v1' });
    uploader.forgetSent(new Set(['u1']));
    expect(items()).toEqual([]);
  });

  it('pauses, and goes on with the same upload', async () => {
    const { uploader, running, phases, items, settle, opened } = setUp();
    await uploader.add('v1', file('a'), front);
    const key = items()[0]?.key ?? '';
    uploader.send(key);
    await settle();
    uploader.pause(key);
    expect(running[0]?.stopped).toBe(true);
    expect(phases()).toEqual(['paused']);
    uploader.send(key);
    await vi.waitFor(() => expect(running).toHaveLength(2));
    expect(running[1]?.url).toBe('/api/uploads/u1');
    expect(opened()).toBe(1);
  });

  it('waits for a lost connection and goes on by itself', async () => {
    const { uploader, running, retries, phases, items, settle } = setUp();
    await uploader.add('v1', file('a'), front);
    uploader.send(items()[0]?.key ?? '');
    await settle();
    running[0]?.onFailed(new ApiProblem('offline'));
    await vi.waitFor(() => expect(phases()).toEqual(['waiting']));
    retries[0]?.();
    await vi.waitFor(() => expect(running).toHaveLength(2));
    expect(running[1]?.url).toBe('/api/uploads/u1');
  });

  it('says the server’s no and does not try again by itself', async () => {
    const { uploader, retries, phases, items } = setUp({
      open: () => Promise.reject(new ApiProblem('consent-missing')),
    });
    await uploader.add('v1', file('a'), front);
    uploader.send(items()[0]?.key ?? '');
    await vi.waitFor(() => expect(phases()).toEqual(['failed']));
    expect(items()[0]?.problem?.code).toBe('consent-missing');
    expect(retries).toHaveLength(0);
  });

  it('takes an upload that has become a clip for sent, though its last answer was lost', async () => {
    const { uploader, running, phases, items, settle } = setUp({
      becameClip: () => Promise.resolve(true),
    });
    await uploader.add('v1', file('a'), front);
    uploader.send(items()[0]?.key ?? '');
    await settle();
    running[0]?.onFailed(new ApiProblem('upload-gone'));
    await vi.waitFor(() => expect(phases()).toEqual(['sent']));
  });

  it('starts anew where the server has forgotten the upload', async () => {
    const { uploader, running, phases, items, settle } = setUp();
    await uploader.add('v1', file('a'), front);
    const key = items()[0]?.key ?? '';
    uploader.send(key);
    await settle();
    running[0]?.onFailed(new ApiProblem('upload-gone'));
    await vi.waitFor(() => expect(phases()).toEqual(['failed']));
    uploader.send(key);
    await vi.waitFor(() => expect(running).toHaveLength(2));
    expect(running[1]?.url).toBe('/api/uploads/u2');
  });

  it('throws away what was sent when it is cancelled', async () => {
    const { uploader, running, giveUp, items, settle } = setUp();
    await uploader.add('v1', file('a'), front);
    const key = items()[0]?.key ?? '';
    uploader.send(key);
    await settle();
    await uploader.cancel(key);
    expect(running[0]?.stopped).toBe(true);
    expect(giveUp).toHaveBeenCalledWith('u1');
    expect(items()).toEqual([]);
  });

  it('does not put the same file on the list twice', async () => {
    const { uploader, items } = setUp();
    await uploader.add('v1', file('a', 'same'), front);
    expect(await uploader.add('v1', file('b', 'same'), front)).toBe('already-there');
    expect(items()).toHaveLength(1);
  });

  it('knows after a reload what was on its way, and goes on when the file is chosen again', async () => {
    const before = setUp();
    before.uploader.restore(keptUploads('maren'));
    await before.uploader.add('v1', file('a', 'content'), front);
    before.uploader.send(before.items()[0]?.key ?? '');
    await before.settle();

    const after = setUp();
    after.uploader.restore(keptUploads('maren'));
    expect(after.items()).toMatchObject([{ phase: 'choose-again', name: 'a', file: null }]);
    expect(await after.uploader.add('v1', file('renamed', 'content'), front)).toBe('resumed');
    await after.settle();
    expect(after.running[0]?.url).toBe('/api/uploads/u1');
    expect(after.opened()).toBe(0);
    after.running[0]?.onDone();
    expect(keptUploads('maren').all()).toEqual([]);
  });

  it('leaves nothing of a person who signs out', async () => {
    const { uploader, running, items, settle } = setUp();
    uploader.restore(keptUploads('maren'));
    await uploader.add('v1', file('a'), front);
    uploader.send(items()[0]?.key ?? '');
    await settle();
    uploader.clear();
    expect(running[0]?.stopped).toBe(true);
    expect(items()).toEqual([]);
    expect(keptUploads('maren').all()).toEqual([]);
  });
});
