/** What the chapters of the story hand on to each other. */
export interface Run {
  readonly familyName: string;
  athleteId: string;
  visitId: string;
  clipId: string;
  /** The replay's address, as it was shown once. */
  link: string;
  /** The same, as it came by e-mail. */
  letterLink: string;
}

export const loadedRun = (): Run => ({
  familyName: `Alder ${process.pid}`,
  athleteId: '',
  visitId: '',
  clipId: '',
  link: '',
  letterLink: '',
});
