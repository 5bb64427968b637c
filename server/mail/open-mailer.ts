import { join } from 'node:path';
import type { Config } from '../main/config.ts';
import { folderMailer } from './folder-mailer.ts';
import type { Mailer } from './mailer.ts';
import { smtpMailer } from './smtp-mailer.ts';

/** Where letters are kept that no server takes. */
export const mailFolder = ({ data }: Pick<Config, 'data'>): string => join(data, 'mail');

/** The mail server where one is set, otherwise a folder of the instance. */
export const openMailer = (config: Pick<Config, 'mail' | 'data'>): Mailer => {
  const { smtpUrl, from } = config.mail;
  return smtpUrl ? smtpMailer(smtpUrl, from) : folderMailer(mailFolder(config), from);
};
