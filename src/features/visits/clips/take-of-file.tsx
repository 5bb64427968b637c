import { takeOfFile } from '../uploads/take.queries.ts';
import type { UploadItem } from '../uploads/upload-item.ts';
import { TakeLookState } from './take-look.tsx';
import { useTakeLook } from './use-take-look.ts';

/** The pictures of a file on this device are looked at as soon as it is chosen, where the browser can. */
export function TakeOfFile({ item, asksPointers }: { item: UploadItem; asksPointers: boolean }) {
  const readable = item.file !== null && item.look?.outcome === 'clip';
  const decodable = item.look?.outcome === 'clip' && item.look.decodableHere;
  const looked = useTakeLook((reach) => takeOfFile(item, reach), readable && decodable);
  if (!readable) return null;
  if (!decodable)
    return (
      <p className="text-note text-soft">
        This browser cannot show its pictures. Whether the take will do is said once it is sent and
        prepared.
      </p>
    );
  return <TakeLookState name={item.name} looked={looked} asksPointers={asksPointers} />;
}
