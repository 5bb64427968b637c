import { Link } from 'react-router-dom';
import { isProblem } from '#src/api/problem.ts';
import { Button } from '#src/ui/button.tsx';
import { roughly } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import type { Verdict } from '../uploads/judge.ts';
import { detailsComplete, percentOf, type UploadItem } from '../uploads/upload-item.ts';
import { uploads } from '../uploads/uploads.ts';
import { FileButton } from './file-button.tsx';

/** The state of an upload and what can be done about it. */
export function UploadActions({
  item,
  verdict,
  primary,
  onFiles,
}: {
  item: UploadItem;
  verdict: Verdict | null;
  primary: boolean;
  onFiles: (files: readonly File[]) => void;
}) {
  const { key, name } = item;
  const act = (label: string, run: () => void) => (
    <Button look="plain" aria-label={`${label}: ${name}`} onClick={run}>
      {label}
    </Button>
  );
  const cancel = act(
    item.phase === 'choose-again' ? 'Forget it' : 'Cancel',
    () => void uploads.cancel(key),
  );
  switch (item.phase) {
    case 'chosen':
      return (
        <>
          {verdict?.sendable === true && (
            <Button
              look={primary && verdict.grade !== 'again' ? 'primary' : 'secondary'}
              aria-label={`${verdict.grade === 'again' ? 'Send it all the same:' : 'Send'} ${name}`}
              disabled={!detailsComplete(item)}
              onClick={() => uploads.send(key)}
            >
              {verdict.grade === 'again' ? 'Send it all the same' : 'Send'}
            </Button>
          )}
          {act('Take away', () => void uploads.cancel(key))}
        </>
      );
    case 'queued':
      return (
        <>
          <StateDot kind="wait">waits for its turn</StateDot>
          {cancel}
        </>
      );
    case 'sending':
      return (
        <>
          <p>{sendingWords(item)}</p>
          <div className="flex gap-5">
            {act('Pause', () => uploads.pause(key))}
            {cancel}
          </div>
        </>
      );
    case 'paused':
      return (
        <>
          <StateDot kind="wait">paused at {percentOf(item)} %</StateDot>
          <div className="flex gap-5">
            {act('Go on', () => uploads.send(key))}
            {cancel}
          </div>
        </>
      );
    case 'waiting':
      return (
        <>
          <p className="tablet:text-right" role="status">
            <StateDot kind="wait" wrap>
              no connection at {percentOf(item)} %: goes on by itself
            </StateDot>
          </p>
          <div className="flex gap-5">
            {act('Try now', () => uploads.send(key))}
            {cancel}
          </div>
        </>
      );
    case 'sent':
      return (
        <p role="status">
          <StateDot kind="done">sent</StateDot>
        </p>
      );
    case 'choose-again':
      return (
        <>
          <FileButton onFiles={onFiles}>Choose the file</FileButton>
          {cancel}
        </>
      );
    case 'failed':
      return (
        <>
          <p className="tablet:text-right" role="alert">
            <StateDot kind="bad" wrap>
              {item.problem?.message ?? 'It could not be sent.'}
            </StateDot>
          </p>
          {isProblem(item.problem, 'sign-in-needed') && (
            <Link to={paths.signIn()}>Sign in again</Link>
          )}
          <div className="flex gap-5">
            {act(item.uploadId === null ? 'Send it again' : 'Go on', () => uploads.send(key))}
            {cancel}
          </div>
        </>
      );
  }
}

function sendingWords(item: UploadItem): string {
  if (item.sentBytes >= item.bytes) return 'sent, being checked';
  const percent = `${percentOf(item)} %`;
  return item.secondsLeft === null ? percent : `${percent}, ${roughly(item.secondsLeft)} left`;
}
