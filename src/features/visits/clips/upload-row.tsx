import type { Visit } from '#shared/contracts/visits.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { fileSize } from '#src/ui/figures.ts';
import { Progress } from '#src/ui/progress.tsx';
import { StateDot, type StateKind } from '#src/ui/state-dot.tsx';
import { Skeleton } from '#src/ui/states.tsx';
import { clipWords } from '#src/ui/words.ts';
import { asksPointers, filmedAs, judge, type Verdict } from '../uploads/judge.ts';
import { detailsComplete, percentOf, type UploadItem } from '../uploads/upload-item.ts';
import { uploads } from '../uploads/uploads.ts';
import { DetailsChoice } from './details-choice.tsx';
import { LocalPicture } from './local-picture.tsx';
import { RowFrame } from './row-frame.tsx';
import { TakeOfFile } from './take-of-file.tsx';
import { UploadActions } from './upload-actions.tsx';

/** A clip that is not on the server yet. */
export function UploadRow({
  visit,
  item,
  only,
  onFiles,
}: {
  visit: Visit;
  item: UploadItem;
  /** The one clip that waits for its word: its button is the page's filled one. */
  only: boolean;
  onFiles: (files: readonly File[]) => void;
}) {
  const protocol = useProtocol();
  const verdict =
    item.look === null ? null : judge(item.look, item.bytes, filmedAs(visit, item, protocol));
  const moving = item.phase === 'sending' || item.phase === 'paused' || item.phase === 'waiting';
  return (
    <RowFrame
      picture={<LocalPicture file={item.file} look={item.look} />}
      title={item.phase === 'chosen' ? item.name : clipWords(item)}
      file={
        item.phase === 'chosen' ? fileSize(item.bytes) : `${item.name}, ${fileSize(item.bytes)}`
      }
      state={<UploadActions item={item} verdict={verdict} primary={only} onFiles={onFiles} />}
    >
      <Look item={item} verdict={verdict} />
      <TakeOfFile item={item} asksPointers={asksPointers(visit, item)} />
      {asksDetails(item) && (
        <DetailsChoice item={item} onChange={(details) => uploads.describe(item.key, details)} />
      )}
      {moving && <Progress percent={percentOf(item)} label={`${item.name}, sent`} />}
    </RowFrame>
  );
}

/** Asked of a clip; of a file that is none only where it could not be sent otherwise. */
const asksDetails = (item: UploadItem) =>
  item.phase === 'chosen' &&
  item.look !== null &&
  (item.look.outcome === 'clip' || !detailsComplete(item));

const KIND: Record<Verdict['grade'], StateKind> = { good: 'done', weak: 'wait', again: 'bad' };

/** What the file itself says, before a byte of it is sent. */
function Look({ item, verdict }: { item: UploadItem; verdict: Verdict | null }) {
  if (item.phase === 'choose-again')
    return (
      <p className="text-note">
        It was on its way before this page was loaded again. Choose the same file, and it goes on
        where it stopped.
      </p>
    );
  if (verdict === null)
    return (
      <div role="status" className="mt-1">
        <span className="sr-only">Looking at {item.name}</span>
        <Skeleton className="h-5 w-56 max-w-full" />
      </div>
    );
  return (
    <div className="text-note" role={item.phase === 'chosen' ? 'status' : undefined}>
      <StateDot kind={KIND[verdict.grade]} wrap>
        {verdict.facts}
        {verdict.facts !== null && (verdict.grade === 'good' ? ': good' : '. ')}
        {verdict.grade !== 'good' && verdict.advice[0]}
      </StateDot>
      {verdict.advice.slice(1).map((advice) => (
        <p key={advice} className="pl-5 text-soft">
          {advice}
        </p>
      ))}
    </div>
  );
}
