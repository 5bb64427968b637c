import type { Role } from '#shared/access/actors.ts';
import type { MailLinkKind } from '#shared/contracts/mail-links.ts';
import { type Letter, momentInWords, written } from '../../mail/letter.ts';

/** A link whose token was just made, with what its letter says. */
export type ArmedLink = {
  readonly kind: MailLinkKind;
  readonly email: string;
  readonly person_name: string;
  readonly practice_name: string;
  readonly role: Role | null;
  readonly by_name: string | null;
  readonly new_email: string | null;
  readonly expires_at: string | Date;
  /** An account that is open has this address already. */
  readonly address_known: boolean;
};

const ROLE_WORDS: Record<Role, string> = {
  owner: 'an owner',
  supervisor: 'a supervisor',
  coach: 'a coach',
};

const UNASKED = 'If you did not ask for this, leave this letter alone: nothing happens.';

/** To an address that has an account already: said to its holder, and to nobody else. */
const known = (reason: string, home: string): Letter =>
  written(
    'You have a Redshank account already',
    reason,
    `There is an account with this address, and an address belongs to one account. Sign in with it here:\n${home}/sign-in`,
    `If you forgot the password, ask for a new one:\n${home}/forgot`,
    'To work in another practice, use another e-mail address.',
  );

/** Every letter of the product that carries a link, in one place. Null: nothing is to be sent. */
export const letterOf = (link: ArmedLink, home: string, token: string): Letter | null => {
  const { practice_name: practice, by_name: by, address_known: isKnown } = link;
  const lasts = `The link works once, until ${momentInWords(link.expires_at)}.`;
  switch (link.kind) {
    case 'invitation': {
      const invited = `${by ?? 'An owner'} invites you to ${practice} as ${ROLE_WORDS[link.role ?? 'coach']}.`;
      if (isKnown) return known(invited, home);
      return written(
        `${by ?? 'An owner'} invites you to ${practice}`,
        invited,
        `Choose a password and begin:\n${home}/join/${token}`,
        lasts,
        'If you do not know who that is, leave this letter alone.',
      );
    }
    case 'start':
      if (isKnown)
        return known(`Somebody wants to start the practice ${practice} with this address.`, home);
      return written(
        `Start ${practice} on Redshank`,
        `Choose a password and ${practice} begins:\n${home}/join/${token}`,
        lasts,
        UNASKED,
      );
    case 'reset':
      if (!isKnown) return null;
      return written(
        'A new password for Redshank',
        `Choose a new password here:\n${home}/reset/${token}`,
        lasts,
        `${UNASKED} Your password stays as it is.`,
      );
    case 'email-from':
      return written(
        'Do you want to change your e-mail address?',
        `Your Redshank account is to sign in with ${link.new_email ?? ''} from now on.`,
        `If that is right, confirm it:\n${home}/confirm-email/${token}`,
        `A second letter went to the new address; the change holds once both are confirmed. ${lasts}`,
        'If you did not ask for this, somebody knows your password: change it now.',
      );
    case 'email-to':
      if (isKnown) return known('Somebody wants to use this address for another account.', home);
      return written(
        'Confirm this e-mail address',
        `A Redshank account is to sign in with this address. If it is yours, confirm it:\n${home}/confirm-email/${token}`,
        `A second letter went to the address so far; the change holds once both are confirmed. ${lasts}`,
        UNASKED,
      );
  }
};
