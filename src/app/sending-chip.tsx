import { Link } from 'react-router-dom';
import { useStore } from 'zustand';
import {
  isUnderWay,
  percentOf,
  type UploadItem,
} from '#src/features/visits/uploads/upload-item.ts';
import { uploads } from '#src/features/visits/uploads/uploads.ts';
import { paths } from '#src/ui/paths.ts';

/** Clips go on being sent while the person works elsewhere: how far they are, and the way back to them. */
export function SendingChip() {
  const items = useStore(uploads.store, (state) => state.items).filter(isUnderWay);
  const [first] = items;
  if (first === undefined) return null;
  const percent = overall(items);
  const what = items.length === 1 ? 'one clip' : `${items.length} clips`;
  const stuck = items.every(({ phase }) => phase === 'waiting');
  return (
    <Link to={`${paths.visit(first.visitId)}#upload`} className="tap whitespace-nowrap text-note">
      <span className="hidden tablet:inline">
        {stuck ? 'Waiting to send' : 'Sending'} {what},{' '}
      </span>
      {percent} %<span className="sr-only tablet:hidden"> of {what} sent</span>
    </Link>
  );
}

/** Percent of all bytes under way. */
function overall(items: readonly UploadItem[]): number {
  const [only] = items;
  if (items.length === 1 && only !== undefined) return percentOf(only);
  const sum = (of: (item: UploadItem) => number) =>
    items.reduce((total, item) => total + of(item), 0);
  return Math.min(
    99,
    Math.floor((sum((item) => item.sentBytes) / sum((item) => item.bytes)) * 100),
  );
}
