import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link, useParams } from 'react-router-dom';
import type { MailLinkKind, MailLinkLook } from '#shared/contracts/mail-links.ts';
import { mailLinkOptions } from '#src/api/accounts.queries.ts';
import { isProblem } from '#src/api/problem.ts';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { Door } from './door.tsx';

/** Looks at the link of the address first: what a dead one leads to is said before anything is typed. */
export function MailLinkDoor({
  title,
  kinds,
  instead,
  children,
}: {
  title: string;
  kinds: readonly MailLinkKind[];
  /** What to do where the link opens nothing. */
  instead: ReactNode;
  children: (link: MailLinkLook, token: string) => ReactNode;
}) {
  const { token = '' } = useParams();
  const link = useQuery(mailLinkOptions(token));
  if (link.isPending)
    return (
      <Door title={title}>
        <Loading label="Looking at the link" />
      </Door>
    );
  if (link.isError && !isProblem(link.error, 'link-gone'))
    return (
      <Door title={title} lead="">
        <ErrorState error={link.error} onRetry={() => void link.refetch()} />
      </Door>
    );
  if (!link.data || !kinds.includes(link.data.kind))
    return (
      <Door
        title="This link opens nothing"
        lead="It was used already, it is too old, or it was not copied whole."
      >
        <div className="space-y-3">
          {instead}
          <p>
            <Link to={paths.signIn()}>To the sign-in</Link>
          </p>
        </div>
      </Door>
    );
  return children(link.data, token);
}
