import type { WordingTexts } from '#shared/contracts/consents.ts';
import { PASSAGES } from './passages.ts';

/** A wording as it is read out. */
export function WordingRead({ texts }: { texts: WordingTexts }) {
  return (
    <dl className="max-w-form">
      {PASSAGES.map(({ key, label }) => (
        <div key={key} className="border-b border-rule py-3 first:pt-0 last:border-0">
          <dt className="font-bold">{label}</dt>
          <dd className="whitespace-pre-line">{texts[key]}</dd>
        </div>
      ))}
    </dl>
  );
}
