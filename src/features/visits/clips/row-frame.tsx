import type { ReactNode } from 'react';

/** A clip as a row: picture, what it is, and on the right its state and what can be done. */
export function RowFrame({
  id,
  picture,
  title,
  file,
  children,
  state,
}: {
  id?: string;
  picture: ReactNode;
  title: string;
  file: string;
  children?: ReactNode;
  state: ReactNode;
}) {
  return (
    <li
      id={id}
      tabIndex={-1}
      data-quiet-focus
      className="grid scroll-mt-4 grid-cols-[54px_minmax(0,1fr)] gap-x-5 gap-y-2 border-b border-rule py-4 last:border-0 tablet:grid-cols-[54px_minmax(0,1fr)_190px] desk:grid-cols-[54px_minmax(0,1fr)_240px]"
    >
      <div className="grid h-24 w-[54px] place-items-center overflow-hidden rounded-[2px] bg-dusk text-dusk-soft">
        {picture}
      </div>
      <div className="min-w-0">
        <h3 className="font-bold">{title}</h3>
        <p className="break-words text-note text-soft">{file}</p>
        {children}
      </div>
      <div className="col-start-2 flex flex-wrap items-center gap-x-5 tablet:col-start-3 tablet:flex-col tablet:items-end">
        {state}
      </div>
    </li>
  );
}

/** Stands where a clip has no picture yet: the outline of somebody on one leg. */
export function NoPicture() {
  return (
    <svg
      width="26"
      height="52"
      viewBox="0 0 26 52"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
    >
      <circle cx="13" cy="6" r="4" />
      <path d="M13 11v15M13 14l-6 9M13 14l6 9M13 26l-1 21h-4M13 26l7 3-2 9" />
    </svg>
  );
}
