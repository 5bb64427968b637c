import { useState } from 'react';
import type { Comment } from '#shared/contracts/comments.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { useComments } from './use-comments.ts';
import { useMeasuredWords } from './use-measured.ts';
import { WordsForm } from './words-form.tsx';

const where = ({ fromFrame, toFrame }: Comment) =>
  fromFrame === toFrame ? `frame ${fromFrame}` : `frames ${fromFrame} to ${toFrame}`;

/** One comment with its answers. */
export function CommentThread({ head, answers }: { head: Comment; answers: readonly Comment[] }) {
  const { store } = useBenchTools();
  const { may } = useBenchDocument();
  const { add, edit, remove } = useComments();
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
      <OwnWords comment={head} mayComment={may.comment} />
      {answers.length > 0 && (
        <ul className="ml-4 border-l border-rule pl-4">
          {answers.map((answer) => (
            <li key={answer.id} className="pt-2">
              <OwnWords comment={answer} mayComment={may.comment} />
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
      {answering && (
        <WordsForm
          label="Answer"
          act="Send"
          onSend={(body) => {
            const { fromFrame, toFrame, id } = head;
            return add({ body, fromFrame, toFrame, answerTo: id });
          }}
          onDone={() => setAnswering(false)}
        />
      )}
    </li>
  );
}

function Words({ comment }: { comment: Comment }) {
  const measured = useMeasuredWords(comment);
  const { shape } = comment;
  return (
    <>
      <p className="whitespace-pre-wrap break-words">{comment.body}</p>
      {measured !== null && <p className="border-l-2 border-ink pl-3 font-bold">{measured}</p>}
      <p className="text-caption text-soft">
        {comment.by.name}, {moment(comment.at)}
        {comment.editedAt !== null && ', changed'}
        {shape !== null && shape.kind !== 'measure' && `, with a ${shape.kind}`}
        {comment.shared && ', shown to the athlete'}
      </p>
    </>
  );
}

/** One's own words can be changed; that they were is shown. */
function OwnWords({ comment, mayComment }: { comment: Comment; mayComment: boolean }) {
  const { edit } = useComments();
  const [changing, setChanging] = useState(false);
  if (changing)
    return (
      <WordsForm
        label="Your comment"
        start={comment.body}
        act="Save"
        onSend={(body) => edit(comment.id, { body })}
        onDone={() => setChanging(false)}
      />
    );
  return (
    <>
      <Words comment={comment} />
      {comment.mine && mayComment && (
        <Button look="plain" onClick={() => setChanging(true)}>
          Change the words
        </Button>
      )}
    </>
  );
}
