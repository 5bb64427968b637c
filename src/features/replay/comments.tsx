import type { PublicReplay } from '#shared/contracts/replays.ts';
import { Button } from '#src/ui/button.tsx';

type Comment = PublicReplay['comments'][number];

/** What was said to the athlete at a moment of the film; each can be looked at. */
export function Comments({
  comments,
  shown,
  onShow,
}: {
  comments: readonly Comment[];
  shown: Comment | null;
  onShow: (comment: Comment) => void;
}) {
  if (comments.length === 0) return null;
  return (
    <section aria-label="Look at this" className="border-t border-rule py-6">
      <h2 className="text-lead font-bold">Look at this</h2>
      <ul>
        {comments.map((comment, n) => (
          <li key={n} className="border-b border-rule py-3 last:border-0">
            <p className="whitespace-pre-line">“{comment.body}”</p>
            {comment.shape?.kind === 'measured' && (
              <p>
                {comment.shape.label}: <b>{comment.shape.text}</b>
              </p>
            )}
            <p className="flex flex-wrap items-center gap-x-4 text-note text-soft">
              {comment.by}
              <Button
                look="plain"
                aria-pressed={comment === shown}
                onClick={() => onShow(comment)}
                className="print:hidden"
              >
                Show me
              </Button>
            </p>
          </li>
        ))}
      </ul>
    </section>
  );
}
