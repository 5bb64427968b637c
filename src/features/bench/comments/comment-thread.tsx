import { useId, useState } from 'react';
import type { Comment } from '#shared/contracts/comments.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { useComments } from './use-comments.ts';

const where = ({ fromFrame, toFrame }: Comment) =>
  fromFrame === toFrame ? `frame ${fromFrame}` : `frames ${fromFrame} to ${toFrame}`;

/** One comment with its answers. */
export function CommentThread({ head, answers }: { head: Comment; answers: readonly Comment[] }) {
  const { store } = useBenchTools();
  const { may } = useBenchDocument();
  const { edit, remove } = useComments();
  const say = useStatus();
  const frame = useBench((state) => state.frame);
  const [answering, setAnswering] = useState(false);
  const here = head.fromFrame <= frame && frame <= head.toFrame;
  const run = (work: Promise<void>) =>
    void work.catch((error: unknown) => say(error instanceof Error ? error.message : 'Not done.'));
  return (
    <li className={`border-t border-rule py-3 ${here ? 'border-l-2 border-l-ink pl-3' : ''}`}>
      <div className="flex flex-wrap items-center justify-between gap-x-4">
        <button
          type="button"
          className="min-h-[24px] text-left font-bold underline underline-offset-[3px]"
          onClick={() => {
            store.setState({ playing: false });
            goTo(store, frameIndex(head.fromFrame));
          }}
        >
          {where(head)}
        </button>
        {head.resolved ? (
          <StateDot kind="done">resolved</StateDot>
        ) : (
          <StateDot kind="wait">open</StateDot>
        )}
      </div>
      <Words comment={head} />
      {answers.length > 0 && (
        <ul className="ml-4 border-l border-rule pl-4">
          {answers.map((answer) => (
            <li key={answer.id} className="pt-2">
              <Words comment={answer} />
            </li>
          ))}
        </ul>
      )}
      {may.comment && (
        <div className="flex flex-wrap gap-x-5">
          {!answering && (
            <Button look="plain" onClick={() => setAnswering(true)}>
              Answer
            </Button>
          )}
          <Button
            look="plain"
            onClick={() => run(edit(head.id, { resolved: head.resolved === null }))}
          >
            {head.resolved ? 'Open again' : 'Resolve'}
          </Button>
          {head.mine && (
            <Button look="plain" onClick={() => run(edit(head.id, { shared: !head.shared }))}>
              {head.shared ? 'Keep from the athlete' : 'Show to the athlete'}
            </Button>
          )}
          {head.mine && answers.length === 0 && (
            <Button look="plain" onClick={() => run(remove(head.id))}>
              Take back
            </Button>
          )}
        </div>
      )}
      {answering && <AnswerForm head={head} onDone={() => setAnswering(false)} />}
    </li>
  );
}

function Words({ comment }: { comment: Comment }) {
  return (
    <>
      <p className="whitespace-pre-wrap break-words">{comment.body}</p>
      <p className="text-caption text-soft">
        {comment.by.name}, {moment(comment.at)}
        {comment.editedAt !== null && ', changed'}
        {comment.shape !== null && `, with a ${comment.shape.kind}`}
        {comment.shared && ', shown to the athlete'}
      </p>
    </>
  );
}

function AnswerForm({ head, onDone }: { head: Comment; onDone: () => void }) {
  const { add } = useComments();
  const say = useStatus();
  const [body, setBody] = useState('');
  const [busy, setBusy] = useState(false);
  const id = useId();
  const send = async () => {
    setBusy(true);
    try {
      const { fromFrame, toFrame } = head;
      await add({ body, fromFrame, toFrame, answerTo: head.id });
      onDone();
    } catch (error) {
      say(error instanceof Error ? error.message : 'The answer was not sent.');
      setBusy(false);
    }
  };
  return (
    <div className="mt-1">
      <label htmlFor={id} className="font-bold">
        Answer
      </label>
      <textarea
        id={id}
        rows={2}
        maxLength={2000}
        className={FIELD_BOX}
        value={body}
        onChange={(event) => setBody(event.target.value)}
      />
      <div className="mt-2 flex gap-3">
        <Button busy={busy} disabled={body.trim() === ''} onClick={() => void send()}>
          Send
        </Button>
        <Button look="plain" onClick={onDone}>
          Not now
        </Button>
      </div>
    </div>
  );
}
