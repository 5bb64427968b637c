import { useState, type FormEvent, type ReactNode } from 'react';
import type { GivenPlan, PainBody, PainPlace } from '#shared/contracts/athlete-plan.ts';
import { Button } from '#src/ui/button.tsx';
import { today } from '#src/ui/days.ts';
import { Fault } from '#src/ui/form/field-frame.tsx';
import { PAIN_PLACE_WORDS, PAIN_TIME_WORDS, PAIN_WHICH_WORDS } from '#src/ui/pain-words.ts';
import { sendPain } from '../replay-api.ts';
import { NOT_KEPT } from './answer-words.ts';

const LEVELS = Array.from({ length: 11 }, (_, n) => n);
const keysOf = <K extends string>(words: Record<K, string>) => Object.keys(words) as K[];

/** The exercises of the plan by their names. */
const named = ({ items }: GivenPlan) =>
  Object.fromEntries(items.map(({ exercise, name }) => [exercise, name])) as Record<
    GivenPlan['items'][number]['exercise'],
    string
  >;

/** How much it hurts, where and when: large things to tap, nothing to type. */
export function PainForm({
  token,
  plan,
  onSaid,
  onClose,
  onEnded,
  onChanged,
}: {
  token: string;
  plan: GivenPlan;
  onSaid: (pain: PainBody) => void;
  onClose: () => void;
  onEnded: () => void;
  onChanged: () => void;
}) {
  const [level, setLevel] = useState<number | null>(null);
  const [places, setPlaces] = useState<readonly PainPlace[]>([]);
  const [which, setWhich] = useState<PainBody['which']>(null);
  const [time, setTime] = useState<PainBody['time']>(null);
  const [exercise, setExercise] = useState<PainBody['exercise']>(null);
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const hurts = level !== null && level > 0;

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (busy) return;
    if (level === null) return setFault('Choose a number from 0 to 10.');
    if (hurts && places.length === 0) return setFault('Say where it hurts.');
    setFault(null);
    setBusy(true);
    const pain: PainBody = hurts
      ? { day: today(), level, places: [...places], which, time, exercise }
      : { day: today(), level, places: [], which: null, time: null, exercise: null };
    const answer = await sendPain(token, pain);
    setBusy(false);
    if (answer === 'kept') return onSaid(pain);
    if (answer === 'gone') return onEnded();
    setFault(NOT_KEPT[answer]);
    if (answer === 'changed') onChanged();
  };

  return (
    <form
      noValidate
      className="my-5 space-y-5 rounded border border-ink p-4 print:hidden"
      onSubmit={(event) => void send(event)}
    >
      <Taps legend="How much does it hurt? 0 is not at all, 10 is the worst you can think of.">
        <div className="grid grid-cols-6 gap-1">
          {LEVELS.map((each) => (
            <Tap key={each} pressed={each === level} onTap={() => setLevel(each)}>
              {each}
            </Tap>
          ))}
        </div>
      </Taps>
      {hurts && (
        <>
          <Taps legend="Where? Tap all that hurt.">
            <div className="flex flex-wrap gap-1">
              {keysOf(PAIN_PLACE_WORDS).map((place) => (
                <Tap
                  key={place}
                  pressed={places.includes(place)}
                  onTap={() =>
                    setPlaces(
                      places.includes(place)
                        ? places.filter((each) => each !== place)
                        : [...places, place],
                    )
                  }
                >
                  {PAIN_PLACE_WORDS[place]}
                </Tap>
              ))}
            </div>
          </Taps>
          <OneOf legend="On which side?" words={PAIN_WHICH_WORDS} value={which} onTap={setWhich} />
          <OneOf legend="When?" words={PAIN_TIME_WORDS} value={time} onTap={setTime} />
          {plan.items.length > 0 && (
            <OneOf
              legend="At which exercise?"
              words={named(plan)}
              value={exercise}
              onTap={setExercise}
            />
          )}
        </>
      )}
      <div role="alert">{fault !== null && <Fault>{fault}</Fault>}</div>
      <div className="flex flex-wrap gap-3">
        <Button type="submit" look="primary" busy={busy} busyLabel="Sending…">
          Send
        </Button>
        <Button look="plain" onClick={onClose}>
          Not now
        </Button>
      </div>
    </form>
  );
}

function Taps({ legend, children }: { legend: string; children: ReactNode }) {
  return (
    <fieldset>
      <legend className="mb-1 font-bold">{legend}</legend>
      {children}
    </fieldset>
  );
}

/** May be left open; a second tap opens it again. */
function OneOf<K extends string>({
  legend,
  words,
  value,
  onTap,
}: {
  legend: string;
  words: Record<K, string>;
  value: K | null;
  onTap: (value: K | null) => void;
}) {
  return (
    <Taps legend={legend}>
      <div className="flex flex-wrap gap-1">
        {keysOf(words).map((each) => (
          <Tap
            key={each}
            pressed={each === value}
            onTap={() => onTap(each === value ? null : each)}
          >
            {words[each]}
          </Tap>
        ))}
      </div>
    </Taps>
  );
}

function Tap({
  pressed,
  onTap,
  children,
}: {
  pressed: boolean;
  onTap: () => void;
  children: ReactNode;
}) {
  return (
    <button
      type="button"
      aria-pressed={pressed}
      onClick={onTap}
      className={`min-h-[48px] rounded border px-3 ${
        pressed ? 'border-ink bg-ink font-bold text-mud' : 'border-edge'
      }`}
    >
      {children}
    </button>
  );
}
