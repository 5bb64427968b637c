import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { callsOptions } from '#src/api/readings.queries.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import type { May } from '#src/api/use-may.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { roughly } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { clipWords } from '#src/ui/words.ts';
import { CorrectClip } from './correct-clip.tsx';

/** The clip's state, where it leads, and what can be put right. */
export function ClipActions({ clip, may }: { clip: Clip; may: May }) {
  const client = useQueryClient();
  const say = useStatus();
  const remove = async () => {
    await call(routes.deleteClip, { params: { id: clip.id } });
    await client.invalidateQueries({ queryKey: visitOptions(clip.visitId).queryKey, exact: true });
    void client.invalidateQueries({ queryKey: todayQuery.queryKey });
    say('The clip is deleted.');
  };
  return (
    <>
      <State clip={clip} />
      {clip.state === 'ready' && <Onward clip={clip} may={may} />}
      <div className="flex gap-5">
        {clip.state !== 'refused' && may('clip.edit') && <CorrectClip clip={clip} />}
        {may('clip.delete') && (
          <ConfirmButton
            look="plain"
            className="text-note !text-alarm"
            label="Delete"
            title="Delete this clip?"
            confirm="Delete it"
            onConfirm={remove}
          >
            <p>
              {clipWords(clip)}, {clip.name}: its reps, marks and comments go with it, and cannot be
              brought back.
            </p>
          </ConfirmButton>
        )}
      </div>
    </>
  );
}

function State({ clip }: { clip: Clip }) {
  switch (clip.state) {
    case 'ready':
      return <StateDot kind="done">ready</StateDot>;
    case 'refused':
      return <StateDot kind="bad">refused</StateDot>;
    case 'waiting':
      if (!clip.trouble) return <StateDot kind="wait">waits to be prepared</StateDot>;
      return clip.trouble.nextTryAt === null ? (
        <StateDot kind="bad">not prepared</StateDot>
      ) : (
        <StateDot kind="wait">waits for another try</StateDot>
      );
    case 'preparing': {
      const percent = clip.progress === null ? '' : `, ${Math.round(clip.progress)} %`;
      return (
        <p className="tablet:text-right">
          <StateDot kind="wait" wrap>
            preparing{percent}
            {clip.secondsLeft !== null && `, ${roughly(clip.secondsLeft)} left`}
          </StateDot>
        </p>
      );
    }
  }
}

function CallFirst({ clip, side, alone }: { clip: Clip; side: Side; alone: boolean }) {
  const calls = useQuery(callsOptions(clip.visitId, side));
  if (!calls.data || calls.data.items.length > 0) return null;
  return (
    <Link to={paths.call(clip.visitId, side)} className="py-2.5 tablet:py-1">
      {alone ? 'Call by eye, then mark' : `Call by eye: ${side} support`}
    </Link>
  );
}

/** The call by eye comes before the marks; a clip of both sides has one for each. */
function Onward({ clip, may }: { clip: Clip; may: May }) {
  const sides = clip.supportSide === null ? (['right', 'left'] as const) : [clip.supportSide];
  return (
    <>
      {may('call.record') &&
        sides.map((side) => (
          <CallFirst key={side} clip={clip} side={side} alone={sides.length === 1} />
        ))}
      <Link to={paths.bench(clip.id)} className="py-2.5 tablet:py-1">
        Open the Bench
      </Link>
    </>
  );
}
