import { join } from 'node:path';
import type { Config } from '../main/config.ts';
import { folderMailer } from './folder-mailer.ts';
import type { Mailer } from './mailer.ts';
import { smtpMailer } from './smtp-mailer.ts';

/** The mail server where one is set, otherwise a folder of the instance. */
export const openMailer = ({ mail, data }: Pick<Config, 'mail' | 'data'>): Mailer =>
  mail.smtpUrl ? smtpMailer(mail.smtpUrl, mail.from) : folderMailer(join(data, 'mail'), mail.from);
