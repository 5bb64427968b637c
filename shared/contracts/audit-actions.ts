/**
 * Everything that is written down, with whether it is done to an athlete (then the entry names them) or to the
 * practice, and what it is called. A new line here is all that a new action needs; the first word says what kind of
 * thing the entry's subject is.
 */
export const AUDIT_ACTIONS = {
  'account.sign-in': ['practice', 'Signed in'],
  'account.sign-in-refused': ['practice', 'Sign-in refused: wrong password'],
  'account.sign-out': ['practice', 'Signed out'],
  'account.sign-out-everywhere': ['practice', 'Signed out on every device'],
  'account.join': ['practice', 'Joined the practice'],
  'account.reset-password': ['practice', 'Set a new password by a link'],
  'practice.start': ['practice', 'Started the practice'],
  'invitation.make': ['practice', 'Invited somebody'],
  'invitation.withdraw': ['practice', 'Ended an invitation'],
  'session.end': ['practice', 'Ended a sign-in on another device'],
  'athlete.add': ['athlete', 'Added an athlete'],
  'athlete.edit': ['athlete', 'Changed an athlete’s details'],
  'consent.record': ['athlete', 'Recorded a consent'],
  'consent.withdraw': ['athlete', 'Withdrew a consent'],
  'visit.add': ['athlete', 'Added a visit'],
  'visit.edit': ['athlete', 'Changed a visit'],
  'visit.safety': ['athlete', 'Answered the safety questions'],
  'visit.export': ['athlete', 'Exported a visit'],
  'clip.upload': ['athlete', 'Uploaded a clip'],
  'clip.open': ['athlete', 'Looked at a clip'],
  'clip.edit': ['athlete', 'Changed how a clip is described'],
  'clip.delete': ['athlete', 'Deleted a clip'],
  'clip.export': ['athlete', 'Exported a clip’s comments'],
  'rep.add': ['athlete', 'Added a rep'],
  'rep.edit': ['athlete', 'Changed a rep'],
  'rep.delete': ['athlete', 'Deleted a rep'],
  'rep.mark': ['athlete', 'Placed marks on a rep'],
  'rep.export': ['athlete', 'Exported a rep'],
  'call.record': ['athlete', 'Recorded a call by eye'],
  'reading.open': ['athlete', 'Opened a reading'],
  'reading.assume': ['athlete', 'Changed what a reading assumes'],
  'reading.renew': ['athlete', 'Had a reading made anew'],
  'second-marking.start': ['athlete', 'Asked for a second marking'],
  'second-marking.finish': ['athlete', 'Finished a second marking'],
  'second-marking.discard': ['athlete', 'Gave up a second marking'],
  'comment.add': ['athlete', 'Commented'],
  'comment.edit': ['athlete', 'Changed a comment'],
  'comment.resolve': ['athlete', 'Resolved or reopened a comment'],
  'comment.delete': ['athlete', 'Deleted a comment'],
  'head.save': ['athlete', 'Drew the box around a head'],
  'head.look': ['athlete', 'Looked whether the head is covered'],
  'replay.make': ['athlete', 'Made a replay link'],
  'replay.revoke': ['athlete', 'Revoked a replay link'],
  'replay.open': ['athlete', 'Opened a replay'],
  'replay.refused': ['athlete', 'Replay refused: wrong pass phrase'],
  'set-up.save': ['practice', 'Saved a set-up'],
  'set-up.delete': ['practice', 'Deleted a set-up'],
  'protocol.change': ['practice', 'Changed the protocol'],
  'practice.edit': ['practice', 'Changed the practice’s name or contact'],
  'audit.export': ['practice', 'Exported the audit trail'],
  'access.refuse': ['practice', 'Refused: not theirs to see or do'],
} as const satisfies Record<string, readonly ['athlete' | 'practice', string]>;

export type AuditedAction = keyof typeof AUDIT_ACTIONS;
export const AUDITED_ACTIONS = Object.keys(AUDIT_ACTIONS) as AuditedAction[];

/** What an entry may say beside that: ids, codes, counts. Nothing that somebody wrote, and nobody's name. */
export const AUDIT_DETAILS = [
  'as',
  'bytes',
  'cleared',
  'clip',
  'fields',
  'frames',
  'marker',
  'on',
  'protocol',
  'px',
  'rep',
  'resolved',
  'rows',
  'session',
  'sessions',
  'side',
  'tried',
  'version',
  'visit',
  'yes',
] as const;
export type AuditDetail = {
  readonly [K in (typeof AUDIT_DETAILS)[number]]?: string | number | boolean | null;
};
