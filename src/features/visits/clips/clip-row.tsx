import { useState } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import { addressOf } from '#src/api/client.ts';
import type { May } from '#src/api/use-may.ts';
import { Progress } from '#src/ui/progress.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { clipWords } from '#src/ui/words.ts';
import { asksPointers } from '../uploads/judge.ts';
import { ClipActions } from './clip-actions.tsx';
import { factsOfClip, fileLine } from './clip-facts.ts';
import { NoPicture, RowFrame } from './row-frame.tsx';
import { TakeOfClip } from './take-of-clip.tsx';
import { TryAgain } from './try-again.tsx';
import { UsePart } from './use-part.tsx';

function Poster({ clipId }: { clipId: string }) {
  const [missing, setMissing] = useState(false);
  if (missing) return <NoPicture />;
  return (
    <img
      src={addressOf(routes.clipPoster, { params: { id: clipId } })}
      alt=""
      loading="lazy"
      onError={() => setMissing(true)}
      className="h-full w-full object-cover"
    />
  );
}

/** A clip that the server has: being prepared, ready or refused. */
export function ClipRow({ visit, clip, may }: { visit: Visit; clip: Clip; may: May }) {
  const facts = factsOfClip(clip);
  return (
    <RowFrame
      id={`clip-${clip.id}`}
      picture={clip.state === 'ready' ? <Poster clipId={clip.id} /> : <NoPicture />}
      title={clipWords(clip)}
      file={fileLine(clip)}
      state={<ClipActions clip={clip} may={may} />}
    >
      {facts !== null && <p className="text-note text-soft">{facts}</p>}
      {clip.refusal !== null && clip.state === 'refused' && (
        <>
          <p className="text-note">
            <StateDot kind="bad" wrap>
              {clip.refusal.sentence}
            </StateDot>
          </p>
          {may('clip.edit') && <UsePart clip={clip} refusal={clip.refusal} />}
        </>
      )}
      {clip.state === 'ready' && (
        <TakeOfClip clip={clip} asksPointers={asksPointers(visit, clip)} />
      )}
      {clip.trouble !== null && <TryAgain clip={clip} trouble={clip.trouble} />}
      {clip.state === 'preparing' && (
        <Progress percent={clip.progress} label={`${clip.name}, prepared`} />
      )}
    </RowFrame>
  );
}
