import type { ReactNode, Ref } from 'react';
import { Bird } from '#src/ui/bird.tsx';

/** A page in front of the product: one thing to do, and nothing of a practice. */
export function Door({
  title,
  titleRef,
  lead,
  children,
}: {
  title: string;
  titleRef?: Ref<HTMLHeadingElement>;
  lead?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <main className="mx-auto w-full max-w-[432px] px-4 pb-16 pt-10 tablet:pt-24">
      <title>{`${title} · Redshank`}</title>
      <p className="mb-8 flex items-center gap-2 text-sub font-bold">
        <Bird />
        Redshank
      </p>
      <h1
        ref={titleRef}
        tabIndex={-1}
        className="text-title-narrow font-bold tracking-[-0.015em] tablet:text-title"
      >
        {title}
      </h1>
      {lead !== undefined && <div className="mb-8 mt-2 text-soft">{lead}</div>}
      {children}
    </main>
  );
}
