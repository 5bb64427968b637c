import { Link } from 'react-router-dom';
import { buttonClass } from './button.tsx';

/** Back and forth through a list whose page stands in the address. `to` gives the address of a page. */
export function Pager({
  page,
  pageSize,
  total,
  to,
  label,
}: {
  page: number;
  pageSize: number;
  total: number;
  to: (page: number) => string;
  /** What is listed: `athletes`. */
  label: string;
}) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1) return null;
  const first = (page - 1) * pageSize + 1;
  return (
    <nav aria-label={`Pages of ${label}`} className="mt-6 flex flex-wrap items-center gap-3">
      {page > 1 && (
        <Link rel="prev" to={to(page - 1)} className={buttonClass()}>
          Back
        </Link>
      )}
      {page < pages && (
        <Link rel="next" to={to(page + 1)} className={buttonClass()}>
          Next
        </Link>
      )}
      <p className="text-soft">
        {first}–{Math.min(page * pageSize, total)} of {total}
      </p>
    </nav>
  );
}
