import type { EntityManager } from '@mikro-orm/postgresql';
import { enqueue } from '../../jobs/job.ts';
import { type Letter, momentInWords, written } from '../../mail/letter.ts';
import { type Notice, SEND_NOTICE } from './jobs/send-notice-type.ts';

/** Asks for the letter in the transaction of what it tells of. */
export const notify = async (
  unit: { readonly em: EntityManager },
  userId: string,
  notice: Notice,
): Promise<void> => {
  await enqueue(unit, SEND_NOTICE, { userId, notice, at: new Date().toISOString() });
};

export const noticeLetter = (
  notice: Notice,
  { at, home }: { readonly at: string; readonly home: string },
): Letter => {
  const when = momentInWords(at);
  const notYou = `If it was not you, choose a new password now:\n${home}/forgot`;
  switch (notice) {
    case 'password-changed':
      return written(
        'Your Redshank password was changed',
        `The password of your account was changed on ${when}. If that was you, there is nothing to do.`,
        `${notYou}\nThen tell the owner of your practice.`,
      );
    case 'codes-on':
      return written(
        'One-time codes are on',
        `Since ${when} your account asks for a one-time code at the sign-in, besides the password. Keep your recovery codes where you find them without your phone.`,
        `${notYou}\nThen tell the owner of your practice.`,
      );
    case 'codes-off':
      return written(
        'One-time codes are off',
        `Since ${when} your account asks for its password alone.`,
        `${notYou}\nThen turn the codes on again:\n${home}/account`,
      );
    case 'codes-reset':
      return written(
        'Your one-time codes were turned off',
        `On ${when} an owner of your practice turned off the one-time codes of your account, so that you can sign in without the phone that you lost. You are signed out everywhere. Turn the codes on again with your new phone:\n${home}/account`,
        'If you did not ask for that, tell the owner of your practice.',
      );
    case 'recovery-used':
      return written(
        'A recovery code was used',
        `On ${when} a recovery code was used in place of a one-time code of your account. How many are left stands on the page of your account.`,
        `${notYou}\nThen make new recovery codes:\n${home}/account`,
      );
    case 'recovery-renewed':
      return written(
        'New recovery codes were made',
        `On ${when} new recovery codes were made for your account. The ones before open nothing any more.`,
        notYou,
      );
  }
};
