import { useEffect } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import type { May } from '#src/api/use-may.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { Button } from '#src/ui/button.tsx';
import { Section } from '#src/ui/page.tsx';
import { Empty } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { filmedAs, judge } from '../uploads/judge.ts';
import { detailsComplete, type ClipDetails } from '../uploads/upload-item.ts';
import { uploads } from '../uploads/uploads.ts';
import { useUploads } from '../use-uploads.ts';
import { ClipRow } from './clip-row.tsx';
import { DropZone } from './drop-zone.tsx';
import { UploadRow } from './upload-row.tsx';

const FIRST_DETAILS: ClipDetails = { view: 'front', supportSide: null, mirrored: false };

/** Clips of this visit: chosen, on their way, being prepared, ready or refused. */
export function UploadStep({
  visit,
  clips,
  may,
  open,
}: {
  visit: Visit;
  clips: readonly Clip[];
  may: May;
  /** Consent and safety check are there. */
  open: boolean;
}) {
  const items = useUploads(visit.id);
  const say = useStatus();
  const protocol = useProtocol();
  useEffect(() => uploads.forgetSent(new Set(clips.map(({ id }) => id))), [clips]);
  const here = items.filter(({ uploadId }) => !clips.some(({ id }) => id === uploadId));
  // a clip that is better copied or filmed again is sent one by one, never along with the others
  const ready = here.filter(
    (item) =>
      item.phase === 'chosen' &&
      item.look !== null &&
      judge(item.look, item.bytes, filmedAs(visit, item, protocol)).grade !== 'again' &&
      detailsComplete(item),
  );

  const take = (files: readonly File[]) => {
    // the next clip is mostly filmed like the last one
    const { view, supportSide, mirrored } = items.at(-1) ?? FIRST_DETAILS;
    for (const file of files)
      void uploads.add(visit.id, file, { view, supportSide, mirrored }).then((added) => {
        if (added === 'already-there') say(`${file.name} is on the list already.`);
        if (added === 'resumed') say(`${file.name} goes on where it stopped.`);
      });
  };
  return (
    <Section id="upload" title="4 Upload" wide>
      {!may('clip.upload') ? (
        clips.length === 0 && <p className="text-soft">No clip yet. The coach sends them.</p>
      ) : open ? (
        <DropZone primary={here.length === 0 && clips.length === 0} onFiles={take} />
      ) : (
        <Empty title="Closed until consent and safety check are there">
          Clips are taken once filming is consented to and the safety questions are answered.
        </Empty>
      )}
      {ready.length > 1 && (
        <Button
          look="primary"
          className="mt-5"
          onClick={() => ready.forEach(({ key }) => uploads.send(key))}
        >
          Send all {ready.length}
        </Button>
      )}
      {(here.length > 0 || clips.length > 0) && (
        <ul className="mt-2" aria-label="Clips of this visit">
          {here.map((item) => (
            <UploadRow
              key={item.key}
              visit={visit}
              item={item}
              only={ready.length <= 1}
              onFiles={take}
            />
          ))}
          {clips.map((clip) => (
            <ClipRow key={clip.id} visit={visit} clip={clip} may={may} />
          ))}
        </ul>
      )}
    </Section>
  );
}
