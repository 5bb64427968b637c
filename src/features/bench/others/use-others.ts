import { useCallback, useEffect, useRef, useState } from 'react';
import type { LiveEvent } from '#shared/contracts/events.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { useMe } from '#src/api/me.ts';
import { useLiveEvents } from '#src/api/use-live.ts';
import { heard, type Other, SAY_EVERY_MS, stillHere } from './others.ts';

/** Says that this clip is open here, and hears who else has it open. Without a connection nobody is known. */
export function useOthers(clipId: string): readonly Other[] {
  const { user } = useMe();
  const [others, setOthers] = useState<readonly Other[]>([]);
  const known = useRef(others);
  useEffect(() => {
    known.current = others;
  }, [others]);

  useEffect(() => {
    const say = (here: boolean) =>
      call(routes.sayHere, { params: { id: clipId }, body: { here }, keepalive: !here }).catch(
        () => undefined,
      );
    const leave = () => void say(false);
    void say(true);
    const timer = setInterval(() => {
      void say(true);
      setOthers((now) => stillHere(now, performance.now()));
    }, SAY_EVERY_MS);
    window.addEventListener('pagehide', leave);
    return () => {
      window.removeEventListener('pagehide', leave);
      clearInterval(timer);
      leave();
    };
  }, [clipId]);

  useLiveEvents(
    useCallback(
      (event: LiveEvent) => {
        if (event.type !== 'here' || event.clipId !== clipId || event.by.id === user.id) return;
        // who has just come does not know yet that this tab is here
        if (event.here && !known.current.some(({ id }) => id === event.by.id))
          void call(routes.sayHere, { params: { id: clipId }, body: { here: true } }).catch(
            () => undefined,
          );
        setOthers((now) => heard(now, event, performance.now()));
      },
      [clipId, user.id],
    ),
  );
  return others;
}
