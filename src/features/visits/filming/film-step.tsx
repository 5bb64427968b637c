import { useState } from 'react';
import type { Visit } from '#shared/contracts/visits.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { type May, useMayInPractice } from '#src/api/use-may.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { Button } from '#src/ui/button.tsx';
import { Fold } from '#src/ui/fold.tsx';
import { studiedBetween } from '#src/ui/gate-words.ts';
import { Section } from '#src/ui/page.tsx';
import { FilmingGuide } from '../guide/filming-guide.tsx';
import { FilmingForm } from './filming-form.tsx';
import { FILMING, lengthWords } from './filming-words.ts';
import { SaveSetUp } from './save-set-up.tsx';
import { SetUpChips } from './set-up-chips.tsx';

/** How this visit is filmed: a saved set-up in one touch, its figures, and the guide. */
export function FilmStep({
  visit,
  may,
  beforeClips,
}: {
  visit: Visit;
  may: May;
  /** Before the first clip the guide stands open. */
  beforeClips: boolean;
}) {
  const mayInPractice = useMayInPractice();
  const protocol = useProtocol();
  const { filming } = visit;
  const known = FILMING.some(({ key }) => filming[key] !== null);
  const [editing, setEditing] = useState(false);
  return (
    <Section
      id="film"
      title="3 Film"
      note="Vermilion: the leg stood on. Teal: the leg lifted."
      wide
    >
      {may('visit.edit') && <SetUpChips visit={visit} />}
      {editing ? (
        <FilmingForm key={visit.version} visit={visit} onDone={() => setEditing(false)} />
      ) : (
        <>
          {!beforeClips && (
            <p className="mt-4 max-w-lead text-note text-soft">
              For clips that are still to be sent. Each clip that is here has its own figures: on
              the Bench, under Set-up.
            </p>
          )}
          <dl className="mt-5 grid grid-cols-2 gap-x-8 gap-y-3 phone:grid-cols-3 desk:grid-cols-5">
            {FILMING.map(({ key, label, unit, without, studied }) => {
              const value = filming[key];
              return (
                <div key={key}>
                  <dt className="text-note leading-5 text-soft">{label}</dt>
                  {value === null ? (
                    <dd className="text-note leading-5">
                      not known
                      <span className="text-soft">
                        : {without}
                        {studied && protocol && studiedBetween(gatesOf(protocol))}
                      </span>
                    </dd>
                  ) : (
                    <dd className="text-filled font-light tracking-[-0.01em]">
                      {lengthWords(value, unit)}
                    </dd>
                  )}
                </div>
              );
            })}
          </dl>
          {may('visit.edit') && (
            <div className="mt-3 flex flex-wrap gap-x-6">
              <Button look="plain" onClick={() => setEditing(true)}>
                {known ? 'Change these figures' : 'Write the figures down'}
              </Button>
              {filming.distanceMm !== null && mayInPractice('set-up.save') && (
                <SaveSetUp filming={filming} />
              )}
            </div>
          )}
        </>
      )}
      <div className="mt-6">
        <Fold title="How to film it" open={beforeClips}>
          {protocol && <FilmingGuide filming={filming} protocol={protocol} />}
        </Fold>
      </div>
    </Section>
  );
}
