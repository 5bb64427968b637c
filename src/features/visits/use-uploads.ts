import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { useStore } from 'zustand';
import { useMe } from '#src/api/me.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { keptUploads } from './uploads/kept-uploads.ts';
import type { UploadItem } from './uploads/upload-item.ts';
import { takeOfClip, takeOfFile } from './uploads/take.queries.ts';
import { uploads } from './uploads/uploads.ts';

const REACHES = ['quick', 'whole'] as const;

/** The uploads of one visit on this device, those from before a reload included. */
export function useUploads(visitId: string): UploadItem[] {
  const client = useQueryClient();
  const userId = useMe().user.id;
  const items = useStore(uploads.store, (state) => state.items);
  useEffect(() => uploads.restore(keptUploads(userId)), [userId]);
  useEffect(
    () =>
      uploads.onSent((item) => {
        // what was seen of the file is not looked for in its copy again
        for (const reach of REACHES) {
          const look = client.getQueryData(takeOfFile(item, reach).queryKey);
          if (look && item.uploadId !== null)
            client.setQueryData(takeOfClip(item.uploadId, reach).queryKey, look);
        }
        void client.invalidateQueries({
          queryKey: visitOptions(item.visitId).queryKey,
          exact: true,
        });
      }),
    [client],
  );
  return useMemo(() => items.filter((item) => item.visitId === visitId), [items, visitId]);
}
