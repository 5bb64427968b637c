import { otherSide, type Side } from '#shared/landmarks/types.ts';
import type { Limb, SideRule } from './exercise.ts';

/** Which side a limb is on for a person who was tested standing on `supportSide`. */
export const sideOf = (limb: Limb, supportSide: Side): Side =>
  limb === 'support' ? supportSide : otherSide(supportSide);

const OTHER: Record<SideRule['other'], (side: Side) => string> = {
  lifted: (side) => `The ${side} foot is off the floor.`,
  'toes-behind': (side) => `The toes of the ${side} foot rest behind.`,
  'knee-down': (side) => `The ${side} knee is down.`,
  'on-floor': (side) => `The ${side} foot rests lightly beside it.`,
  alternates: () => 'Both legs take turns.',
};

/** Leg and hands by their sides, in sentences; what was set by the rule and is still to be confirmed. */
export const sideLines = (rule: SideRule, supportSide: Side): string[] => {
  const hands = (what: Limb | 'both', both: string, one: (side: Side) => string) =>
    what === 'both' ? both : one(sideOf(what, supportSide));
  const stands = sideOf(rule.stands, supportSide);
  return [
    rule.other === 'alternates' ? `Begin on the ${stands} leg.` : `Stand on the ${stands} leg.`,
    OTHER[rule.other](otherSide(stands)),
    ...(rule.load === null
      ? []
      : [hands(rule.load, 'Weight in both hands.', (side) => `Weight in the ${side} hand.`)]),
    ...(rule.support === null
      ? []
      : [
          hands(
            rule.support,
            'Both hands on the support.',
            (side) => `The ${side} hand on the support.`,
          ),
        ]),
  ];
};

/** Drawings show a person who stands on the right leg. */
export const isMirrored = (supportSide: Side): boolean => supportSide === 'left';
