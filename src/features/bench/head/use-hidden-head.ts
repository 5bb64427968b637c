import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { createContext, useEffect, useMemo, useRef, useState } from 'react';
import type { Box } from '#shared/geometry/boxes.ts';
import type { Head, HeadPage } from '#shared/contracts/heads.ts';
import { routes } from '#shared/contracts/routes.ts';
import { type DrawnHead, type FollowedHead, headGrowth } from '#shared/head/head-track.ts';
import { type HeadOnFrame, headsOf } from '#shared/head/heads.ts';
import { call } from '#src/api/client.ts';
import { headOptions } from '#src/api/heads.queries.ts';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { openTrackerOf } from '../follow/open-tracker.ts';
import { followHeads, reachOf } from './follow-head.ts';

interface Draft {
  readonly drawn: readonly DrawnHead[];
  readonly followed: readonly FollowedHead[];
}

export type HeadRun =
  | { readonly is: 'idle' }
  | { readonly is: 'following'; readonly part: number }
  | { readonly is: 'failed'; readonly message: string };

export interface HiddenHead {
  /** Undefined until it was read. */
  readonly page: HeadPage | undefined;
  readonly error: Error | null;
  readonly retry: () => void;
  /** The version on the server, where nothing was drawn since. */
  readonly saved: Head | null;
  /** Something was drawn that is not followed and saved yet. */
  readonly changed: boolean;
  /** What hides the head on each frame, by what is drawn now. */
  readonly heads: readonly HeadOnFrame[];
  readonly run: HeadRun;
  readonly draw: (frame: number, box: Box) => void;
  readonly discard: () => void;
  readonly follow: () => Promise<void>;
  readonly stop: () => void;
  readonly confirm: () => void;
  readonly confirming: boolean;
}

/** Null where no head is hidden, as in a second marking. */
export const HeadContext = createContext<HiddenHead | null>(null);

const sentence = (error: unknown): string =>
  error instanceof Error ? error.message : 'The box could not be followed.';

/** The box around the head of the open clip: drawn, followed, saved and looked at. Used once. */
export function useHiddenHead(): HiddenHead {
  const { clipId, times, frameSize, copySize } = useBenchTools();
  const { clip } = useBenchDocument();
  const open = useBench((state) => state.desk === 'head');
  const client = useQueryClient();
  const { data: page, error, refetch } = useQuery({ ...headOptions(clipId), enabled: open });
  const [draft, setDraft] = useState<Draft | null>(null);
  const [run, setRun] = useState<HeadRun>({ is: 'idle' });
  const stopper = useRef<AbortController>(null);
  useEffect(() => () => stopper.current?.abort(), []);

  const last = times.length - 1;
  const head = page?.head ?? null;
  const now: Draft = useMemo(
    () => draft ?? { drawn: head?.drawn ?? [], followed: head?.followed ?? [] },
    [draft, head],
  );
  const growth = headGrowth(clip.frameRate?.minPerSecond ?? null);
  const heads = useMemo(
    () => headsOf({ ...frameSize, ...now, fromFrame: 0, toFrame: last, growth }),
    [frameSize, now, last, growth],
  );
  const keep = (next: HeadPage) => client.setQueryData(headOptions(clipId).queryKey, next);
  const looked = useMutation({
    mutationFn: (version: number) =>
      call(routes.lookedAtHead, { params: { id: clipId }, body: { version } }),
    onSuccess: keep,
    onError: (failure) => {
      setRun({ is: 'failed', message: sentence(failure) });
      void refetch();
    },
  });

  const follow = async () => {
    const own = (stopper.current = new AbortController());
    const { signal } = own;
    setRun({ is: 'following', part: 0 });
    try {
      const tracker = await openTrackerOf(clip, frameSize, copySize, times)(signal);
      const followed = await followHeads(
        tracker,
        now.drawn,
        { last, picture: frameSize },
        { signal, onProgress: (part) => setRun({ is: 'following', part }) },
      ).finally(() => tracker.close());
      setDraft({ drawn: now.drawn, followed });
      const body = {
        after: head?.version ?? 0,
        ...{ fromFrame: 0, toFrame: last, drawn: [...now.drawn], followed },
      };
      keep(await call(routes.saveHead, { params: { id: clipId }, body, signal }));
      setDraft(null);
      setRun({ is: 'idle' });
    } catch (failure) {
      if (signal.aborted) {
        setRun({ is: 'idle' });
        return;
      }
      setRun({ is: 'failed', message: sentence(failure) });
      void refetch();
    }
  };

  return {
    page,
    error,
    retry: () => void refetch(),
    saved: draft ? null : head,
    changed: draft !== null,
    heads,
    run,
    draw(frame, box) {
      // what was followed from the boxes around it no longer holds
      const { from, to } = reachOf(frame, now.drawn, last);
      setDraft({
        drawn: [...now.drawn.filter((each) => each.frame !== frame), { frame, box }].sort(
          (a, b) => a.frame - b.frame,
        ),
        followed: now.followed.filter((each) => each.frame < from || each.frame > to),
      });
    },
    discard: () => setDraft(null),
    follow,
    stop: () => stopper.current?.abort(),
    confirm: () => head && looked.mutate(head.version),
    confirming: looked.isPending,
  };
}
