import { randomUUID } from 'node:crypto';
import { mkdir, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import type { Mail, Mailer } from './mailer.ts';

/** Keeps every letter as an .eml file in a folder: the inbox of an instance without a mail server. */
export const folderMailer = (folder: string, from: string): Mailer => {
  const transport = createTransport(
    { streamTransport: true, buffer: true, newline: 'unix' },
    { from },
  );
  return {
    async send({ to, subject, text }: Mail) {
      const { message } = await transport.sendMail({ to, subject, text });
      await mkdir(folder, { recursive: true, mode: 0o700 });
      const path = join(
        folder,
        `${new Date().toISOString().replaceAll(':', '-')}-${randomUUID()}.eml`,
      );
      await writeFile(`${path}.new`, message as Buffer, { mode: 0o600 });
      await rename(`${path}.new`, path);
    },
    close: () => undefined,
  };
};
