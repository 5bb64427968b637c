import { createStore } from 'zustand/vanilla';
import type { LocalLook } from '#src/video/look-at-file.ts';
import { ApiProblem, isProblem } from '#src/api/problem.ts';
import type { KeptUploads } from './kept-uploads.ts';
import { secondsLeft, withSample, type Sample } from './time-left.ts';
import type { StartTransfer } from './transfer.ts';
import {
  detailsComplete,
  keptOf,
  newItem,
  restoredItem,
  type ClipDetails,
  type UploadItem,
} from './upload-item.ts';

export type UploaderParts = {
  lookAt: (file: File) => Promise<LocalLook>;
  print: (file: File) => Promise<string>;
  open: (item: UploadItem) => Promise<{ id: string; uploadUrl: string }>;
  /** Throws away what the server received. */
  giveUp: (uploadId: string) => Promise<unknown>;
  /** Whether an upload that is no longer known has become a clip. */
  becameClip: (uploadId: string) => Promise<boolean>;
  startTransfer: StartTransfer;
  now: () => number;
  /** Calls once after `ms`, or sooner when the network comes back. Returns how not to. */
  whenOnline: (run: () => void, ms: number) => () => void;
};

/** What became of a chosen file: a new clip, one from before a reload that goes on, or one chosen already. */
export type Added = 'added' | 'resumed' | 'already-there';

/** So many at once: more would only slow each other down on one connection. */
const AT_ONCE = 3;
const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 30_000;

/**
 * Sends clips, several at once, and goes on after a pause, a lost connection or a reload. It lives as long as
 * the tab, not as long as a page: going elsewhere in the product does not stop it.
 */
export function createUploader(parts: UploaderParts) {
  const store = createStore<{ items: readonly UploadItem[] }>(() => ({ items: [] }));
  const stops = new Map<string, () => void>();
  const waits = new Map<string, number>();
  const sentListeners = new Set<(item: UploadItem) => void>();
  let kept: KeptUploads | null = null;
  let counter = 0;

  const items = () => store.getState().items;
  const find = (key: string) => items().find((item) => item.key === key);
  const patch = (key: string, change: Partial<UploadItem>) =>
    store.setState({
      items: items().map((item) => (item.key === key ? { ...item, ...change } : item)),
    });
  const drop = (key: string) =>
    store.setState({ items: items().filter((item) => item.key !== key) });
  const halt = (key: string) => {
    stops.get(key)?.();
    stops.delete(key);
  };

  /** Starts what waits for its turn, as far as there is room. */
  const next = () => {
    const busy = items().filter(({ phase }) => phase === 'sending').length;
    const queued = items().filter(({ phase }) => phase === 'queued');
    for (const item of queued.slice(0, Math.max(0, AT_ONCE - busy))) void run(item.key);
  };

  const fail = async (key: string, problem: ApiProblem) => {
    stops.delete(key);
    const item = find(key);
    if (item === undefined) return;
    if (isProblem(problem, 'offline', 'shutting-down')) {
      const wait = waits.get(key) ?? FIRST_WAIT_MS;
      waits.set(key, Math.min(wait * 2, LONGEST_WAIT_MS));
      patch(key, { phase: 'waiting', secondsLeft: null });
      stops.set(
        key,
        parts.whenOnline(() => queue(key), wait),
      );
    } else if (isProblem(problem, 'upload-gone', 'not-found') && item.uploadId !== null) {
      kept?.forget(item.uploadId);
      // the last byte may have arrived just before the connection broke
      if (await parts.becameClip(item.uploadId).catch(() => false)) finish(key);
      else patch(key, { phase: 'failed', problem, uploadId: null, uploadUrl: null, sentBytes: 0 });
    } else patch(key, { phase: 'failed', problem, secondsLeft: null });
    next();
  };

  const finish = (key: string) => {
    stops.delete(key);
    waits.delete(key);
    const item = find(key);
    if (item === undefined) return;
    if (item.uploadId !== null) kept?.forget(item.uploadId);
    patch(key, { phase: 'sent', sentBytes: item.bytes, secondsLeft: null });
    for (const listener of sentListeners) listener({ ...item, phase: 'sent' });
    next();
  };

  const openFor = async (item: UploadItem): Promise<string> => {
    if (item.uploadUrl !== null) return item.uploadUrl;
    const { id: uploadId, uploadUrl } = await parts.open(item);
    patch(item.key, { uploadId, uploadUrl });
    if (item.print !== null) kept?.keep(keptOf({ ...item, uploadId, uploadUrl }, item.print));
    return uploadUrl;
  };

  const run = async (key: string) => {
    const item = find(key);
    if (item?.file === null || item === undefined) return;
    patch(key, { phase: 'sending', problem: null });
    let samples: Sample[] = [];
    try {
      const uploadUrl = await openFor(item);
      // paused or cancelled while the server was asked
      if (find(key)?.phase !== 'sending') return;
      stops.set(
        key,
        parts.startTransfer(item.file, uploadUrl, {
          onProgress: (sentBytes) => {
            waits.delete(key);
            samples = withSample(samples, { at: parts.now(), bytes: sentBytes });
            patch(key, { sentBytes, secondsLeft: secondsLeft(samples, item.bytes) });
          },
          onDone: () => finish(key),
          onFailed: (problem) => void fail(key, problem),
        }),
      );
    } catch (error) {
      const problem = error instanceof ApiProblem ? error : new ApiProblem('unexpected');
      await fail(key, problem);
    }
  };

  const queue = (key: string) => {
    const item = find(key);
    if (item === undefined || item.file === null || !detailsComplete(item)) return;
    halt(key);
    patch(key, { phase: 'queued', problem: null });
    next();
  };

  const add = async (visitId: string, file: File, details: ClipDetails): Promise<Added> => {
    const key = `upload-${(counter += 1)}`;
    store.setState({ items: [...items(), newItem(key, visitId, file, details)] });
    const print = await parts.print(file).catch(() => null);
    const same = items().find(
      (other) =>
        print !== null && other.key !== key && other.visitId === visitId && other.print === print,
    );
    if (same !== undefined && same.phase !== 'failed') {
      drop(key);
      if (same.phase !== 'choose-again') return 'already-there';
      patch(same.key, { file, name: file.name });
      queue(same.key);
      patch(same.key, { look: await parts.lookAt(file) });
      return 'resumed';
    }
    patch(key, { print });
    patch(key, { look: await parts.lookAt(file) });
    return 'added';
  };

  return {
    store,
    add,
    /** Sends it, or goes on with it. Nothing happens while its details are incomplete. */
    send: queue,
    describe: (key: string, details: Partial<ClipDetails>) => patch(key, details),
    pause: (key: string) => {
      halt(key);
      patch(key, { phase: 'paused', secondsLeft: null });
      next();
    },
    /** Takes it away; what the server has of it is thrown away too. */
    cancel: async (key: string) => {
      const item = find(key);
      halt(key);
      drop(key);
      next();
      if (item === undefined || item.uploadId === null || item.phase === 'sent') return;
      kept?.forget(item.uploadId);
      // where the server cannot be told, it forgets unfinished uploads by itself
      await parts.giveUp(item.uploadId).catch(() => undefined);
    },
    /** Takes away what was sent, once its clip is on the page. */
    forgetSent: (clipIds: ReadonlySet<string>) => {
      const gone = (item: UploadItem) => item.uploadId !== null && clipIds.has(item.uploadId);
      if (items().some(gone)) store.setState({ items: items().filter((item) => !gone(item)) });
    },
    /** From now on unfinished uploads are kept for this person, and those from before a reload come back. */
    restore: (own: KeptUploads) => {
      kept = own;
      const known = new Set(items().map(({ uploadId }) => uploadId));
      const back = own.all().filter(({ uploadId }) => !known.has(uploadId));
      const restored = back.map((upload) => restoredItem(`upload-${(counter += 1)}`, upload));
      if (restored.length > 0) store.setState({ items: [...items(), ...restored] });
    },
    /** Stops and forgets everything: the person signs out. */
    clear: () => {
      for (const { key } of items()) halt(key);
      kept?.clear();
      kept = null;
      store.setState({ items: [] });
    },
    onSent: (listener: (item: UploadItem) => void) => {
      sentListeners.add(listener);
      return () => void sentListeners.delete(listener);
    },
  };
}
export type Uploader = ReturnType<typeof createUploader>;
