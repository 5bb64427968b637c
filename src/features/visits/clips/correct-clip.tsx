import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { benchOptions } from '#src/api/bench.queries.ts';
import { call } from '#src/api/client.ts';
import { sidesKey } from '#src/api/readings.queries.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { detailsComplete, type ClipDetails } from '../uploads/upload-item.ts';
import { DetailsChoice } from './details-choice.tsx';

/** Puts right how a clip was filmed, after it was sent. */
export function CorrectClip({ clip }: { clip: Clip }) {
  const [details, setDetails] = useState<ClipDetails | null>(null);
  const client = useQueryClient();
  const say = useStatus();
  const save = useMutation({
    mutationFn: (body: ClipDetails) =>
      call(routes.editClip, { params: { id: clip.id }, body: { ...body, version: clip.version } }),
    onSuccess: async () => {
      setDetails(null);
      say('Saved.');
      await Promise.all([
        client.invalidateQueries({ queryKey: visitOptions(clip.visitId).queryKey, exact: true }),
        client.invalidateQueries({ queryKey: sidesKey(clip.visitId) }),
        client.invalidateQueries({ queryKey: benchOptions(clip.id).queryKey }),
      ]);
    },
  });
  const { view, supportSide, mirrored } = clip;
  return (
    <>
      <Button
        look="plain"
        className="text-note"
        onClick={() => setDetails({ view, supportSide, mirrored })}
      >
        Correct
      </Button>
      <Dialog open={details !== null} title="How was it filmed?" onClose={() => setDetails(null)}>
        {details !== null && (
          <>
            <DetailsChoice
              item={details}
              onChange={(change) => setDetails({ ...details, ...change })}
            />
            {save.isError && (
              <div className="mt-4">
                <ErrorState error={save.error} />
              </div>
            )}
            <div className="mt-6 flex flex-wrap gap-3">
              <Button
                look="primary"
                disabled={!detailsComplete(details)}
                busy={save.isPending}
                busyLabel="Saving …"
                onClick={() => save.mutate(details)}
              >
                Save
              </Button>
              <Button onClick={() => setDetails(null)}>Leave as it was</Button>
            </div>
          </>
        )}
      </Dialog>
    </>
  );
}
