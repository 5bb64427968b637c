import type { Side, View } from '#shared/contracts/primitives.ts';
import { Checkbox } from '#src/ui/checkbox.tsx';
import { Segmented } from '#src/ui/segmented.tsx';
import type { ClipDetails } from '../uploads/upload-item.ts';

const VIEWS: { value: View; label: string }[] = [
  { value: 'front', label: 'Front' },
  { value: 'back', label: 'Back' },
  { value: 'lifted-side', label: 'Lifted side' },
  { value: 'support-side', label: 'Support side' },
];
type Stands = Side | 'both';

/** How a clip was filmed: view, leg stood on, mirrored. A side view shows one leg, so it asks which. */
export function DetailsChoice({
  item,
  onChange,
}: {
  item: ClipDetails;
  onChange: (details: Partial<ClipDetails>) => void;
}) {
  const sideView = item.view === 'lifted-side' || item.view === 'support-side';
  const stands: { value: Stands; label: string }[] = [
    { value: 'right', label: 'Right' },
    { value: 'left', label: 'Left' },
    ...(sideView ? [] : [{ value: 'both' as const, label: 'Both, in turn' }]),
  ];
  return (
    <div className="mt-3 flex flex-wrap gap-x-8 gap-y-3">
      <Segmented
        legend="View"
        choices={VIEWS}
        value={item.view}
        onChange={(view) => onChange({ view })}
      />
      <Segmented
        legend="Stands on"
        choices={stands}
        value={item.supportSide ?? (sideView ? null : 'both')}
        onChange={(side) => onChange({ supportSide: side === 'both' ? null : side })}
      />
      <Checkbox
        className="w-full !border-b-0"
        label="The picture is mirrored"
        note="Only selfie cameras do that. Left and right are put right again."
        checked={item.mirrored}
        onChange={(event) => onChange({ mirrored: event.target.checked })}
      />
    </div>
  );
}
