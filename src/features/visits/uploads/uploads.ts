import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { guardLeaving } from '#src/api/leaving.ts';
import { isProblem } from '#src/api/problem.ts';
import { filePrint } from './file-print.ts';
import { startTransfer } from './transfer.ts';
import { isUnderWay, percentOf } from './upload-item.ts';
import { createUploader } from './uploader.ts';

/** The tab's uploads. */
export const uploads = createUploader({
  // the container reader is fetched with the first file
  lookAt: async (file) => (await import('#src/video/look-at-file.ts')).lookAtFile(file),
  print: filePrint,
  open: ({ visitId, name, bytes, view, supportSide, mirrored }) =>
    call(routes.openUpload, {
      params: { id: visitId },
      body: { name, bytes, view, supportSide, mirrored },
    }),
  giveUp: (id) => call(routes.cancelUpload, { params: { id } }),
  becameClip: (id) =>
    call(routes.clip, { params: { id } }).then(
      () => true,
      (error: unknown) => {
        if (isProblem(error, 'not-found')) return false;
        throw error;
      },
    ),
  startTransfer,
  now: () => performance.now(),
  whenOnline: (run, ms) => {
    const once = () => {
      stop();
      run();
    };
    const timer = setTimeout(once, ms);
    window.addEventListener('online', once);
    const stop = () => {
      clearTimeout(timer);
      window.removeEventListener('online', once);
    };
    return stop;
  },
});

const sentHere = new Set<string>();
uploads.onSent(({ uploadId }) => {
  if (uploadId !== null) sentHere.add(uploadId);
});
/** Sent from this tab: whoever sent it may still have the athlete before them. */
export const wasSentHere = (clipId: string): boolean => sentHere.has(clipId);

const underWay = () => uploads.store.getState().items.filter(isUnderWay);

guardLeaving({
  wouldLose: () => {
    const [first, ...more] = underWay();
    if (first === undefined) return Promise.resolve(null);
    const rest = more.length === 0 ? '' : ` ${more.length} more clips wait behind it.`;
    return Promise.resolve(
      `${first.name} is ${percentOf(first)} % sent; signing out stops it.${rest}`,
    );
  },
  discard: () => uploads.clear(),
});

// the browser's own question before the tab closes
window.addEventListener('beforeunload', (event) => {
  if (underWay().length > 0) event.preventDefault();
});
