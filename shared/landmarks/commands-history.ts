/** What was done since the Bench was opened, newest last, and what was taken back of it. */
export interface History<Step> {
  readonly done: readonly Step[];
  readonly undone: readonly Step[];
}

export const emptyHistory = <Step>(): History<Step> => ({ done: [], undone: [] });

/** A new step ends the chance to redo what was taken back before it. */
export const record = <Step>(history: History<Step>, step: Step): History<Step> => ({
  done: [...history.done, step],
  undone: [],
});

/** The step to take back, and the history after it; null at the moment of opening. */
export const stepBack = <Step>(history: History<Step>): [Step, History<Step>] | null => {
  const step = history.done.at(-1);
  if (step === undefined) return null;
  return [step, { done: history.done.slice(0, -1), undone: [...history.undone, step] }];
};

/** The step to do again, and the history after it; null where nothing was taken back. */
export const stepAgain = <Step>(history: History<Step>): [Step, History<Step>] | null => {
  const step = history.undone.at(-1);
  if (step === undefined) return null;
  return [step, { done: [...history.done, step], undone: history.undone.slice(0, -1) }];
};
