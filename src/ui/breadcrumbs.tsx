import { Fragment } from 'react';
import { Link } from 'react-router-dom';

export type Crumb = { label: string; to?: string };

export function Breadcrumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="flex flex-wrap gap-x-2 pt-4 text-soft tablet:pt-7">
      {crumbs.map((crumb, n) => (
        <Fragment key={crumb.label}>
          {n > 0 && <span aria-hidden="true">/</span>}
          {crumb.to === undefined ? (
            <span>{crumb.label}</span>
          ) : (
            <Link to={crumb.to} className="tap">
              {crumb.label}
            </Link>
          )}
        </Fragment>
      ))}
    </nav>
  );
}
