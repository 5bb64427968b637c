import type { Response } from 'express';
import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../main/feature.ts';
import { isFleeting, type Listener } from './event-hub.ts';
import type { LiveEvent, ToldEvent } from './tell.ts';

const HEARTBEAT_MS = 20_000;

/** One frame of an event stream. The name `message` is what EventSource hears without being told a name. */
const frame = (event: LiveEvent, id?: string): string =>
  `${id === undefined ? '' : `id: ${id}\n`}data: ${JSON.stringify(event)}\n\n`;

const openStream = (res: Response): void => {
  res.writeHead(200, {
    'Content-Type': 'text/event-stream; charset=utf-8',
    // Proxies neither keep, compress nor hold back the stream.
    'Cache-Control': 'no-store, no-transform',
    'X-Accel-Buffering': 'no',
    Connection: 'keep-alive',
  });
  res.write('retry: 2000\n\n');
};

/** One stream per tab. A tab that comes back is told what it missed, or that nobody knows what it missed. */
export const eventsFeature: Feature = ({ serve, ground: { events, sessions } }) => {
  serve(routes.events, ({ req, res, actor, session }) => {
    openStream(res);
    const send = ({ event, id }: ToldEvent): void => {
      res.write(frame(event, isFleeting(event) ? undefined : id));
    };
    const listener: Listener = {
      actor,
      sessionId: session.id,
      send,
      close: () => {
        res.end();
      },
    };
    const lastId = req.get('last-event-id');
    if (lastId !== undefined) {
      const missed = events.since(lastId, listener);
      if (missed) missed.forEach(send);
      else res.write(frame({ type: 'missed' }));
    }
    const remove = events.add(listener);
    const heartbeat = setInterval(() => {
      res.write(': still here\n\n');
      // A session can end without a word: by its last day, or because the account was closed.
      sessions.findById(session.id).then(
        (open) => {
          if (!open) res.end(frame({ type: 'signed-out' }));
        },
        () => undefined,
      );
    }, HEARTBEAT_MS);
    res.on('close', () => {
      clearInterval(heartbeat);
      remove();
    });
  });
};
