import type { ReactNode } from 'react';
import { Breadcrumbs, type Crumb } from './breadcrumbs.tsx';
import { cx } from './class-names.ts';

/** A page of paper: title, one lead sentence, its actions, then sections. */
export function Page({
  title,
  documentTitle,
  crumbs,
  lead,
  actions,
  children,
}: {
  title: ReactNode;
  /** For the tab and the history; the title where that is text. */
  documentTitle?: string;
  crumbs?: readonly Crumb[];
  lead?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
}) {
  const name = documentTitle ?? (typeof title === 'string' ? title : null);
  return (
    <div className="mx-auto max-w-page px-4 pb-16 tablet:px-12 tablet:pb-24">
      {name !== null && <title>{`${name} · Redshank`}</title>}
      {crumbs && <Breadcrumbs crumbs={crumbs} />}
      <div
        className={cx(
          'flex flex-wrap items-end justify-between gap-x-6 gap-y-5 pb-7',
          crumbs ? 'pt-1' : 'pt-6 tablet:pt-9',
        )}
      >
        <div className="min-w-0">
          <h1
            tabIndex={-1}
            className="text-title-narrow font-bold tracking-[-0.015em] tablet:text-title"
          >
            {title}
          </h1>
          {lead !== undefined && <div className="mt-2 max-w-lead text-lead">{lead}</div>}
        </div>
        {actions !== undefined && <div className="flex flex-wrap gap-3">{actions}</div>}
      </div>
      {children}
    </div>
  );
}

/** One thing of a page: its name on the left, the matter, and how to read it in the margin. */
export function Section({
  title,
  note,
  margin,
  wide = false,
  first = false,
  id,
  children,
}: {
  title: string;
  note?: ReactNode;
  margin?: ReactNode;
  /** The matter takes the margin's place too; a margin then stands below it. */
  wide?: boolean;
  first?: boolean;
  id?: string;
  children: ReactNode;
}) {
  return (
    <section
      id={id}
      tabIndex={id === undefined ? undefined : -1}
      data-quiet-focus={id === undefined ? undefined : true}
      aria-label={title}
      className={cx('section scroll-mt-4', wide && 'section-wide', first && 'section-first')}
    >
      <div className="section-head">
        <h2 className="text-sub font-bold tablet:text-body">{title}</h2>
        {note !== undefined && <div className="mt-1 text-note text-soft">{note}</div>}
      </div>
      <div className="section-matter">{children}</div>
      {margin !== undefined && (
        <div className="section-margin space-y-3 text-note text-soft">{margin}</div>
      )}
    </section>
  );
}
