import { mkdirSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { SMTPServer } from 'smtp-server';

export interface MailCatcher {
  /** what the app gets as REDSHANK_SMTP_URL */
  url: string;
  stop(): Promise<void>;
}

/** A mail server on 127.0.0.1 that delivers nothing: each message becomes a file `<n>.eml` in the folder. */
export async function catchMail(folder: string): Promise<MailCatcher> {
  mkdirSync(folder, { recursive: true });
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, _session, done) {
      buffer(stream).then(
        (message) => {
          count += 1;
          const file = join(folder, `${String(count).padStart(6, '0')}.eml`);
          // readers must never see half a message
          writeFileSync(`${file}.part`, message);
          renameSync(`${file}.part`, file);
          done();
        },
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      );
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.on('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const address = server.server.address();
  if (address === null || typeof address === 'string')
    throw new Error('the mail server has no port');
  return {
    url: `smtp://127.0.0.1:${address.port}`,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
