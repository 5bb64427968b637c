/** Files of the person themselves, such as the scans of consents, lie under this prefix. */
export const athletePrefix = (practiceId: string, athleteId: string): string =>
  `${practiceId}/athletes/${athleteId}`;
