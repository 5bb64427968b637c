import { contactParts } from './words/contact.ts';

/** How the practice is reached, with what can be called or written to as something to tap. */
export function Contact({ contact, className }: { contact: string; className?: string }) {
  const parts = contactParts(contact);
  if (parts.length === 0) return null;
  return (
    <span className={className}>
      {parts.map(({ text, to }) =>
        to === null ? (
          text
        ) : (
          <a key={text} href={to} className="inline-block min-h-[44px] leading-[44px]">
            {text}
          </a>
        ),
      )}
    </span>
  );
}
