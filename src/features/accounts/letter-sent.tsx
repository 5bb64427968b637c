import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#src/ui/paths.ts';
import { Door } from './door.tsx';

/** The same for every address: who has an account is nobody's business but their own. */
export function LetterSent({ email, lasts }: { email: string; lasts: string }) {
  const title = useRef<HTMLHeadingElement>(null);
  useEffect(() => title.current?.focus(), []);
  return (
    <Door
      titleRef={title}
      title="Look into your mail"
      lead={
        <>
          <p>
            If <b className="break-words text-ink">{email}</b> can be used for this, a letter is on
            its way to it. Its link works once, for {lasts}.
          </p>
          <p className="mt-3">
            Nothing there after some minutes? Look into the folder for spam too.
          </p>
        </>
      }
    >
      <Link to={paths.signIn()}>To the sign-in</Link>
    </Door>
  );
}
