import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { cx } from './class-names.ts';

/** Nothing here yet: one sentence that says what to do next, and the way there. */
export function Empty({
  title,
  children,
  action,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="max-w-lead">
      <p className="text-sub font-bold">{title}</p>
      {children !== undefined && <div className="mt-1 text-soft">{children}</div>}
      {action !== undefined && <div className="mt-4 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}

/** A grey place of the size of what comes, so that nothing jumps. Give it that size by class. */
export function Skeleton({ className }: { className?: string }) {
  return <span aria-hidden="true" className={cx('block rounded bg-rule/60', className)} />;
}

/** Lines of text that are still to come. */
export function SkeletonLines({ count = 3 }: { count?: number }) {
  return (
    <div aria-hidden="true">
      {Array.from({ length: count }, (_, n) => (
        <div key={n} className={cx('flex h-12 items-center', n > 0 && 'border-t border-rule')}>
          <Skeleton
            className={cx('h-4', n % 3 === 0 ? 'w-3/5' : n % 3 === 1 ? 'w-2/5' : 'w-1/2')}
          />
        </div>
      ))}
    </div>
  );
}

/** Skeletons for the eye, one word for the ear. */
export function Loading({ label = 'Loading', children }: { label?: string; children?: ReactNode }) {
  return (
    <div role="status" aria-busy="true">
      <span className="sr-only">{label}…</span>
      {children ?? <SkeletonLines />}
    </div>
  );
}

const textField = (error: unknown, name: string): string | null => {
  if (typeof error !== 'object' || error === null) return null;
  const value: unknown = Reflect.get(error, name);
  return typeof value === 'string' && value !== '' ? value : null;
};

/** What could not be loaded or done, what to do, and the number that finds it in the server's log. */
export function ErrorState({
  error,
  title,
  onRetry,
  children,
}: {
  error: unknown;
  title?: string;
  onRetry?: () => void;
  children?: ReactNode;
}) {
  const message = textField(error, 'message') ?? 'Something went wrong on this page.';
  const requestId = textField(error, 'requestId');
  return (
    <div role="alert" className="max-w-lead border-l-[3px] border-alarm py-0.5 pl-3.5">
      {title !== undefined && <p className="font-bold text-alarm">{title}</p>}
      <p>{message}</p>
      {requestId !== null && (
        <p className="text-caption text-soft">
          If it stays so, tell the owner of the practice this number:{' '}
          <span className="select-all break-all">{requestId}</span>
        </p>
      )}
      {(onRetry !== undefined || children !== undefined) && (
        <div className="mt-2 flex flex-wrap items-center gap-3">
          {onRetry && <Button onClick={onRetry}>Try again</Button>}
          {children}
        </div>
      )}
    </div>
  );
}

/** A caution where the act happens: ochre edge, ink words. */
export function Caution({ title, children }: { title?: string; children: ReactNode }) {
  return (
    <div className="border-l-[3px] border-ochre py-0.5 pl-3.5 text-ink">
      {title !== undefined && <b className="text-ochre">{title} </b>}
      {children}
    </div>
  );
}
