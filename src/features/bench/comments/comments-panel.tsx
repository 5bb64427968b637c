import type { Comment } from '#shared/contracts/comments.ts';
import { useBenchDocument } from '../bench-context.ts';
import { CommentForm } from './comment-form.tsx';
import { CommentThread } from './comment-thread.tsx';

/** Threads in the order of the clip, open ones first at the same moment. */
const threadsOf = (comments: readonly Comment[]) =>
  comments
    .filter((each) => each.answerTo === null)
    .sort((a, b) => a.fromFrame - b.fromFrame || a.at.localeCompare(b.at))
    .map((head) => ({
      head,
      answers: comments
        .filter((each) => each.answerTo === head.id)
        .sort((a, b) => a.at.localeCompare(b.at)),
    }));

/** Comments at moments of the clip: write, answer, resolve; a press goes there. */
export function CommentsPanel() {
  const { comments, may } = useBenchDocument();
  const threads = threadsOf(comments);
  return (
    <div className="max-w-[38em]">
      {may.comment && <CommentForm />}
      {threads.length === 0 ? (
        <p className="border-t border-rule py-4 text-soft">
          No comments yet. One stands at a frame or a stretch of frames, with a point, a ring or a
          stroke on the picture, or a measure of its frame, if you wish.
        </p>
      ) : (
        <ul>
          {threads.map(({ head, answers }) => (
            <CommentThread key={head.id} head={head} answers={answers} />
          ))}
        </ul>
      )}
    </div>
  );
}
