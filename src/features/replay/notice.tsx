import { Button } from '#src/ui/button.tsx';
import type { Opening } from './replay-api.ts';

type Failed = Exclude<Opening['is'], 'open' | 'phrase'>;

/** What happened and what the athlete can do about it; a button only where trying again may help. */
const NOTICES: Record<Failed, { title: string; text: string; again: boolean }> = {
  gone: {
    title: 'This link no longer opens anything',
    text: 'It has ended, or its address was not copied completely. Ask the person who sent it for a new one, or open the message again and tap the link itself.',
    again: false,
  },
  ended: {
    title: 'This link has ended',
    text: 'It was ended, or its time is over, while this page was open. Ask the person who sent it for a new one.',
    again: false,
  },
  'too-many-tries': {
    title: 'Too many tries',
    text: 'Wait a quarter of an hour, then open the link again. If you do not have the pass phrase, ask the person who sent the link.',
    again: true,
  },
  offline: {
    title: 'There is no connection',
    text: 'The replay could not be reached. Check Wi-Fi or mobile data, then try again.',
    again: true,
  },
  broken: {
    title: 'The replay could not be opened',
    text: 'Something went wrong on our side. Try again in a minute; if it stays so, tell the person who sent the link.',
    again: true,
  },
};

export function Notice({ opening, onAgain }: { opening: { is: Failed }; onAgain: () => void }) {
  const { title, text, again } = NOTICES[opening.is];
  return (
    <main className="mx-auto max-w-form p-4 pt-12 tablet:p-12">
      <title>{`${title} · Redshank`}</title>
      <h1 tabIndex={-1} className="text-title-narrow font-bold">
        {title}
      </h1>
      <p className="mt-4 text-sub leading-7">{text}</p>
      {again && (
        <Button look="primary" className="mt-6" onClick={onAgain}>
          Try again
        </Button>
      )}
      <p className="mt-10 border-t border-rule pt-4 text-note text-soft">
        If something hurts, do not wait for a link: stop, and speak with the person who treats you.
      </p>
    </main>
  );
}
