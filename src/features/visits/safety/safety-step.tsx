import { useState } from 'react';
import type { Visit } from '#shared/contracts/visits.ts';
import type { May } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { Caution } from '#src/ui/states.tsx';
import { SafetyForm } from './safety-form.tsx';
import { yesAnswers } from './safety-schema.ts';
import { SAFETY_WORDS } from './safety-words.ts';

export function SafetyStep({ visit, may }: { visit: Visit; may: May }) {
  const { safety } = visit;
  const [again, setAgain] = useState(false);
  return (
    <Section
      id="safety"
      title="2 Safety"
      margin={
        <p>
          Asked at every visit. The answers stay with it, so that a later reader sees that it was
          asked. An aid to trained judgement: local rules and licensed practice come first.
        </p>
      }
    >
      {safety === null && !may('visit.edit') ? (
        <p className="text-soft">The questions have not been asked yet. The coach asks them.</p>
      ) : safety === null || again ? (
        <SafetyForm
          visit={visit}
          onSaved={() => setAgain(false)}
          onLeave={safety === null ? undefined : () => setAgain(false)}
        />
      ) : (
        <Answered safety={safety} onAgain={may('visit.edit') ? () => setAgain(true) : undefined} />
      )}
    </Section>
  );
}

function Answered({
  safety,
  onAgain,
}: {
  safety: NonNullable<Visit['safety']>;
  /** Left out where this person may not ask. */
  onAgain?: () => void;
}) {
  const yes = yesAnswers(safety.answers);
  const asked = `asked by ${safety.askedBy.name}, ${moment(safety.askedAt)}`;
  return (
    <>
      {yes.length === 0 ? (
        <StateDot kind="done" wrap>
          All answered with no, {asked}
        </StateDot>
      ) : (
        <>
          <StateDot kind={safety.mayFilm ? 'wait' : 'bad'} wrap>
            {safety.mayFilm
              ? `Cleared by ${safety.clearedBy ?? 'a clinician'}`
              : 'Not to be filmed'}
            , {asked}
          </StateDot>
          <ul className="mt-2">
            {yes.map((question) => (
              <li key={question} className="border-b border-rule py-2 last:border-0">
                <b>Yes:</b> {SAFETY_WORDS[question].question}
              </li>
            ))}
          </ul>
          {!safety.mayFilm && (
            <div className="mt-3">
              <Caution title="Do not film.">
                Speak with the person who treats this athlete. A clinician’s clearance is recorded
                by asking again.
              </Caution>
            </div>
          )}
        </>
      )}
      {safety.chaperone === true && (
        <p className="mt-1 text-soft">A guardian or chaperone was in the room.</p>
      )}
      {onAgain && (
        <p>
          <Button look="plain" onClick={onAgain}>
            Ask again
          </Button>
        </p>
      )}
    </>
  );
}
