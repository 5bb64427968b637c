/**
 * Every way in which the API says no, by code. The status and the title of a code are fixed here;
 * the detail of one occurrence is written where it is thrown (RFC 9457 problem details).
 */
export const PROBLEMS = {
  // who you are
  'sign-in-needed': [401, 'Sign in first.'],
  'sign-in-refused': [401, 'This e-mail address and password do not belong together.'],
  'foreign-origin': [403, 'This request came from another site.'],
  'not-allowed': [403, 'Your role does not include this.'],
  'link-gone': [
    410,
    'This link does not work any more: it was used, it is too old, or it is not whole. Ask for a new one.',
  ],
  'address-taken': [409, 'There is an account with this e-mail address already. Sign in with it.'],
  'password-wrong': [403, 'This is not your present password.'],
  // the second step of a sign-in
  'code-wrong': [
    401,
    'This code does not fit. Each works once and for about a minute: take the next one.',
  ],
  'half-gone': [401, 'This took too long, or your password was changed. Start the sign-in again.'],
  'codes-on': [409, 'One-time codes are on already.'],
  'codes-off': [409, 'One-time codes are not on.'],
  'codes-needed': [
    403,
    'Your practice asks its owners for one-time codes. Set them up first, and leave them on.',
  ],
  'codes-first': [409, 'Turn on one-time codes for your own account first.'],
  'last-owner': [409, 'A practice needs an owner. Make somebody else an owner first.'],
  'too-many-tries': [429, 'Too many tries. Wait a little, then try again.'],
  'upload-quota': [429, 'You have sent as much as one person may within a day. Go on tomorrow.'],
  // what you asked for
  'not-found': [404, 'There is nothing here, or nothing that you may see.'],
  'invalid-input': [422, 'Some of what was sent cannot be used.'],
  'unreadable-body': [400, 'The request could not be read.'],
  'body-too-large': [413, 'That is more than this address takes.'],
  'unsupported-media-type': [415, 'This address does not take that kind of content.'],
  'range-not-satisfiable': [416, 'The file has no such part.'],
  'edited-meanwhile': [
    409,
    'Somebody else changed this meanwhile. Look at the newer version, then try again.',
  ],
  // consent and safety
  'consent-missing': [
    409,
    'There is no valid consent for filming. Record it on the athlete’s page first.',
  ],
  'consent-withdrawn': [
    403,
    'The consent to filming was withdrawn. What was filmed is closed, and is deleted on the day that the athlete’s page names.',
  ],
  'supervision-not-agreed': [
    403,
    'The athlete has not agreed that a supervisor looks at this, or has withdrawn it.',
  ],
  'safety-check-missing': [409, 'Ask the safety questions of this visit first.'],
  'safety-check-stops': [
    409,
    'A safety answer speaks against filming. Speak with the person who treats this athlete.',
  ],
  // clips
  'not-as-it-stands': [409, 'This cannot be done to it as it stands.'],
  'clip-not-ready': [409, 'The clip is still being prepared.'],
  'clip-refused': [409, 'This clip was refused and has no pictures to show.'],
  'clip-missing-in-storage': [503, 'The clip’s file cannot be reached right now.'],
  'upload-incomplete': [400, 'The upload ended before the file was complete. Send it again.'],
  'support-side-needed': [422, 'A side view needs to know which leg the athlete stands on.'],
  'frame-out-of-range': [422, 'The clip has no such frame.'],
  'upload-gone': [410, 'This upload is no longer known. Start it again.'],
  // reps, calls and readings
  'boundaries-out-of-order': [422, 'The moments of a rep must follow each other.'],
  'landmark-not-in-view': [422, 'This landmark is not marked in this view.'],
  'call-first': [409, 'Record your call by eye first. Figures are shown after it.'],
  'reading-provisional': [
    409,
    'It rests on marks that the computer followed and nobody has looked at. Look at them on the Bench first.',
  ],
  // second markings
  'nothing-to-mark-again': [
    409,
    'Nothing on these frames was placed by hand yet. Mark the rep first.',
  ],
  'second-marking-open': [
    409,
    'This person has a second marking of this rep to finish. Finish or give it up first.',
  ],
  'second-marking-finished': [409, 'This second marking is finished and stays as it is.'],
  'second-marks-missing': [
    409,
    'Some landmarks are neither placed nor marked hidden. Mark them first.',
  ],
  'marker-cannot-see': [
    422,
    'This person may not mark this athlete. Ask their coach, or a supervisor assigned to that coach.',
  ],
  'not-asked-here': [422, 'This landmark is not asked for on this frame.'],
  // plans
  'reading-not-final': [
    409,
    'This reading still rests on marks that nobody has looked at, or is being made anew. Finish it first.',
  ],
  'plan-there-already': [409, 'This side of the visit has a plan already. Open it and change it.'],
  'retest-first': [409, 'What was found leads to a retest, not to exercises.'],
  'held-back': [409, 'This exercise is held back for this athlete.'],
  'plan-not-ready': [409, 'This plan cannot be given to the athlete yet.'],
  'plan-not-running': [409, 'There is no plan running on this link.'],
  // reports
  'report-being-made': [
    409,
    'A report of this visit is being made. Wait until it is ready, then ask for the next.',
  ],
  'report-missing-in-storage': [503, 'The report’s file cannot be reached right now.'],
  // replays
  'head-not-covered': [409, 'The head is not covered on every frame that would be shown.'],
  'head-not-looked-at': [409, 'Nobody has looked yet whether the head is covered.'],
  'letter-not-sent': [
    503,
    'The letter could not be sent. Copy the address instead, or try again in a moment.',
  ],
  'pass-phrase-needed': [401, 'This replay asks for a pass phrase.'],
  // the house
  'storage-full': [507, 'There is no room left to keep this. Tell the owner of the practice.'],
  'shutting-down': [503, 'Redshank is restarting. Try again in a moment.'],
  unexpected: [500, 'Something went wrong on our side.'],
} as const satisfies Record<string, readonly [status: number, title: string]>;

export type ProblemCode = keyof typeof PROBLEMS;

/** One fault of an input: where it is (`body.givenName`) and what to do about it. */
export type Fault = { path: string; message: string };

/** The body of `application/problem+json`. `requestId` finds the log line. */
export type ProblemBody = {
  type: string;
  code: ProblemCode;
  title: string;
  status: number;
  detail?: string;
  requestId: string;
  faults?: Fault[];
};
