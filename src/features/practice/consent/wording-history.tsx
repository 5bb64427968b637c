import type { ConsentWording } from '#shared/contracts/consents.ts';
import { moment } from '#src/ui/days.ts';
import { Fold } from '#src/ui/fold.tsx';
import { Section } from '#src/ui/page.tsx';
import { changedPassages } from './passages.ts';
import { WordingRead } from './wording-read.tsx';

const given = (count: number): string =>
  count === 0
    ? 'No consent was given to it yet.'
    : `${count} ${count === 1 ? 'consent was' : 'consents were'} given to it.`;

/** Every version, newest first: who wrote it, when and why, and its words. */
export function WordingHistory({ history }: { history: readonly ConsentWording[] }) {
  return (
    <Section
      title="Versions"
      margin={<p>None is ever changed or deleted: a consent must be read as it was given.</p>}
    >
      <ol>
        {history.map(({ id, version, at, by, note, texts, consents }, n) => {
          const before = history[n + 1];
          return (
            <li key={id} className="border-b border-rule py-4 first:pt-0 last:border-0">
              <h3 className="font-bold">
                Wording {version}
                {n === 0 && <span className="font-normal text-soft"> is read out now</span>}
              </h3>
              <p className="text-note text-soft">
                {moment(at)}, {by ? `by ${by.name}` : 'came with the practice'}. {given(consents)}
              </p>
              <p className="mt-1">{note}</p>
              {before && (
                <p className="mt-1 text-note text-soft">
                  Changed: {changedPassages(before.texts, texts).join('; ')}.
                </p>
              )}
              {n > 0 && (
                <Fold title={`Read wording ${version}`}>
                  <WordingRead texts={texts} />
                </Fold>
              )}
            </li>
          );
        })}
      </ol>
    </Section>
  );
}
