import type { Comment as CommentShape } from '#shared/contracts/comments.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Comment } from './comment.entity.ts';

/** By moment; answers stand at the moment of what they answer and follow it in time. */
export const COMMENT_ORDER = { fromFrame: 'asc', at: 'asc', id: 'asc' } as const;

/** @param comment with `by` and `resolvedBy` loaded */
export const presentComment = (comment: Comment, readerId: string): CommentShape => ({
  id: comment.id,
  clipId: comment.clip.id,
  answerTo: comment.answerTo ?? null,
  body: comment.body,
  fromFrame: comment.fromFrame,
  toFrame: comment.toFrame,
  shape: comment.shape ?? null,
  shared: comment.shared,
  by: presentPerson(comment.by.unwrap()),
  at: comment.at.toISOString(),
  editedAt: comment.editedAt?.toISOString() ?? null,
  resolved:
    comment.resolvedBy && comment.resolvedAt
      ? {
          by: presentPerson(comment.resolvedBy.unwrap()),
          at: comment.resolvedAt.toISOString(),
        }
      : null,
  mine: comment.by.id === readerId,
});
