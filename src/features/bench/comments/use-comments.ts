import { useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import type * as z from 'zod';
import type { commentBody, commentEdit } from '#shared/contracts/comments.ts';
import { routes } from '#shared/contracts/routes.ts';
import { benchOptions, commentsOptions } from '#src/api/bench.queries.ts';
import { call } from '#src/api/client.ts';
import { withComment, withoutComment } from '../actions/bench-cache.ts';
import { useBenchTools } from '../bench-context.ts';

export interface CommentActions {
  add: (body: z.input<typeof commentBody>) => Promise<void>;
  edit: (id: string, change: z.input<typeof commentEdit>) => Promise<void>;
  remove: (id: string) => Promise<void>;
}

export function useComments(): CommentActions {
  const client = useQueryClient();
  const { clipId } = useBenchTools();
  return useMemo(() => {
    const { queryKey } = benchOptions(clipId);
    const listed = () =>
      void client.invalidateQueries({ queryKey: commentsOptions(clipId).queryKey });
    return {
      async add(body) {
        const comment = await call(routes.addComment, { params: { id: clipId }, body });
        client.setQueryData(queryKey, (known) => known && withComment(known, comment));
        listed();
      },
      async edit(id, body) {
        const comment = await call(routes.editComment, { params: { id }, body });
        client.setQueryData(queryKey, (known) => known && withComment(known, comment));
        listed();
      },
      async remove(id) {
        await call(routes.deleteComment, { params: { id } });
        client.setQueryData(queryKey, (known) => known && withoutComment(known, id));
        listed();
      },
    };
  }, [client, clipId]);
}
