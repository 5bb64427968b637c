import * as z from 'zod';
import { side, view } from '#shared/contracts/primitives.ts';

const kept = z.object({
  uploadId: z.string(),
  uploadUrl: z.string(),
  visitId: z.string(),
  print: z.string(),
  name: z.string(),
  bytes: z.number(),
  view,
  supportSide: side.nullable(),
  mirrored: z.boolean(),
});
/** What is needed to go on with an upload after a reload; the file itself must be chosen again. */
export type KeptUpload = z.infer<typeof kept>;

const keyOf = (userId: string) => `redshank.uploads.${userId}`;

/** The unfinished uploads of one person on this device. */
export function keptUploads(userId: string, storage: Storage = localStorage) {
  const read = (): KeptUpload[] => {
    try {
      const list: unknown = JSON.parse(storage.getItem(keyOf(userId)) ?? '[]');
      return z.array(kept).parse(list);
    } catch {
      // written by another version, or storage is closed to this page: nothing to go on with
      return [];
    }
  };
  const write = (list: readonly KeptUpload[]) => {
    try {
      if (list.length === 0) storage.removeItem(keyOf(userId));
      else storage.setItem(keyOf(userId), JSON.stringify(list));
    } catch {
      // a full or closed storage costs the resuming after a reload, nothing else
    }
  };
  return {
    all: read,
    keep: (upload: KeptUpload) =>
      write([...read().filter(({ uploadId }) => uploadId !== upload.uploadId), upload]),
    forget: (uploadId: string) => write(read().filter((upload) => upload.uploadId !== uploadId)),
    clear: () => write([]),
  };
}
export type KeptUploads = ReturnType<typeof keptUploads>;
