import { Link } from 'react-router-dom';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { cx } from '#src/ui/class-names.ts';
import { Progress } from '#src/ui/progress.tsx';
import type { Task } from './task-of.ts';

/** One thing that waits. Only the most pressing one of the page is a filled button. */
export function TaskRow({ task, pressing }: { task: Task; pressing: boolean }) {
  const { title, detail, when, action, progress } = task;
  const name = `${action.label}: ${title}`;
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 border-b border-rule py-3 first:pt-0 last:border-0 tablet:grid-cols-[minmax(0,1fr)_150px_150px] desk:grid-cols-[minmax(0,1fr)_196px_176px] desk:gap-x-6">
      <div className="col-span-2 tablet:col-span-1">
        <p className="break-words font-bold">{title}</p>
        <p className="text-soft">{detail}</p>
        {progress !== undefined && <Progress percent={progress} label={title} />}
      </div>
      <p className={cx('self-center text-soft tablet:mt-0 tablet:self-start', pressing && 'mt-2')}>
        {when}
      </p>
      <p className="text-right">
        {pressing ? (
          <ButtonLink look="primary" to={action.to} aria-label={name} className="mt-2 tablet:-mt-1">
            {action.label}
          </ButtonLink>
        ) : (
          <Link
            to={action.to}
            aria-label={name}
            className="inline-flex min-h-[44px] items-center tablet:min-h-0 tablet:py-2.5 tablet:-my-2.5"
          >
            {action.label}
          </Link>
        )}
      </p>
    </li>
  );
}
