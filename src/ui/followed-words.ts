/** How many marks there are, how many of them were followed by the computer, and how many of those a person looked at. */
export interface FollowedCount {
  readonly marks: number;
  readonly followed: number;
  readonly looked: number;
}

/** `918 marks: 909 followed, 900 of them looked at.` Null where none was followed. */
export const followedWords = ({ marks, followed, looked }: FollowedCount): string | null =>
  followed === 0
    ? null
    : `${marks} marks: ${followed} followed, ${looked === followed ? 'all looked at' : `${looked} of them looked at`}.`;
