import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { addressOf, call } from '#src/api/client.ts';
import type { Reach, TakeLook } from '#src/tracking/take/look-at-take.ts';
import type { TakeAsked } from '#src/tracking/worker/take.worker.ts';
import { frameTimes } from '#src/video/frame-times.ts';
import type { UploadItem } from './upload-item.ts';

const lookInWorker = async (asked: TakeAsked, signal: AbortSignal): Promise<TakeLook> =>
  // fetched with the first file
  (await import('#src/tracking/worker/look-in-worker.ts')).lookInWorker(asked, signal);

/** A look is kept as long as the tab; a clip never changes. */
const ONCE = { staleTime: Infinity, gcTime: Infinity, retry: false } as const;

/** Of a file on this device. Ends with the row that shows it. */
export const takeOfFile = ({ key, file }: Pick<UploadItem, 'key' | 'file'>, reach: Reach) =>
  queryOptions({
    ...ONCE,
    queryKey: ['take', 'file', key, reach],
    queryFn: ({ signal }) =>
      file ? lookInWorker({ file, reach }, signal) : Promise.reject(new Error('no file')),
  });

/** Of the prepared copy, for what this browser could not decode; the Bench loads the same bytes. */
export const takeOfClip = (id: string, reach: Reach) =>
  queryOptions({
    ...ONCE,
    queryKey: ['take', 'clip', id, reach],
    queryFn: async ({ signal }) => {
      const { frames } = await call(routes.clip, { params: { id }, signal });
      if (!frames) throw new Error('not prepared');
      const url = new URL(addressOf(routes.clipVideo, { params: { id } }), location.href).href;
      return lookInWorker({ clip: { url, frameTable: frameTimes(frames) }, reach }, signal);
    },
  });
