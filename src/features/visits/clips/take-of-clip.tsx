import { useState } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import { Button } from '#src/ui/button.tsx';
import { fileSize } from '#src/ui/figures.ts';
import { takeOfClip } from '../uploads/take.queries.ts';
import { wasSentHere } from '../uploads/uploads.ts';
import { TakeLookState } from './take-look.tsx';
import { useTakeLook } from './use-take-look.ts';

/** Of a clip that was sent from this tab its pictures are looked at by themselves; of others when asked to. */
export function TakeOfClip({ clip, asksPointers }: { clip: Clip; asksPointers: boolean }) {
  const [asked, setAsked] = useState(() => wasSentHere(clip.id));
  const [pressed, setPressed] = useState(false);
  const looked = useTakeLook((reach) => takeOfClip(clip.id, reach), asked);
  const press = () => {
    setAsked(true);
    setPressed(true);
  };
  if (!asked && !looked.look)
    return (
      <Button look="plain" className="text-note" onClick={press}>
        Will this take do?{clip.copy !== null && ` (loads ${fileSize(clip.copy.bytes)})`}
        <span className="sr-only">: {clip.name}</span>
      </Button>
    );
  return <TakeLookState {...{ looked, asksPointers }} name={clip.name} asked={pressed} />;
}
