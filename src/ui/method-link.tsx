import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { paths } from './paths.ts';

/** From a number to how it is made: its error, its source, what it cannot say. */
export function MethodLink({
  to,
  children = 'How it is computed',
}: {
  /** A measure's id or a section of the method page. */
  to: string;
  children?: ReactNode;
}) {
  return (
    <Link to={paths.method(to)} className="tap">
      {children}
    </Link>
  );
}
