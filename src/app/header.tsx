import { Link, NavLink } from 'react-router-dom';
import { useMe } from '#src/api/me.ts';
import { Bird } from '#src/ui/bird.tsx';
import { Disclosure } from '#src/ui/disclosure.tsx';
import { paths } from '#src/ui/paths.ts';
import { PersonMenu } from './person-menu.tsx';
import { SendingChip } from './sending-chip.tsx';

/** The places a person goes to from anywhere. */
const PLACES: readonly { to: string; label: string; end?: boolean }[] = [
  { to: paths.today(), label: 'Today', end: true },
  { to: paths.athletes(), label: 'Athletes' },
  { to: paths.review(), label: 'Review' },
  { to: paths.compare(), label: 'Compare' },
  { to: paths.practice(), label: 'Practice' },
  { to: paths.method(), label: 'Method' },
];

const linkClass = ({ isActive }: { isActive: boolean }) =>
  `flex items-center border-y-2 border-t-transparent no-underline hover:text-ink ${
    isActive ? 'border-b-ink font-bold text-ink' : 'border-b-transparent text-soft'
  }`;

export function Header() {
  const { practice } = useMe();
  return (
    <header className="flex h-14 items-center gap-4 border-b border-rule bg-mud px-4 tablet:gap-8 tablet:px-12 print:hidden">
      <Link
        to={paths.today()}
        className="flex min-h-[44px] items-center gap-2 text-sub font-bold no-underline"
      >
        <Bird />
        Redshank
      </Link>
      <nav aria-label="Main" className="hidden gap-6 self-stretch tablet:flex">
        {PLACES.map(({ to, label, end }) => (
          <NavLink key={to} to={to} end={end} className={linkClass}>
            {label}
          </NavLink>
        ))}
      </nav>
      <div className="ml-auto flex items-center gap-2 tablet:gap-4">
        <SendingChip />
        <span className="hidden text-soft tablet:inline">{practice.name}</span>
        <Disclosure
          className="tablet:hidden"
          panelClassName="w-56"
          button={
            <span className="rounded border border-edge px-2.5 py-1.5 text-note font-bold">
              Menu
            </span>
          }
        >
          <nav aria-label="Main">
            <ul className="px-4 py-2">
              {PLACES.map(({ to, label, end }) => (
                <li key={to} className="border-b border-rule last:border-0">
                  <NavLink
                    to={to}
                    end={end}
                    className={({ isActive }) =>
                      `flex min-h-[44px] items-center no-underline ${isActive ? 'font-bold' : ''}`
                    }
                  >
                    {label}
                  </NavLink>
                </li>
              ))}
            </ul>
          </nav>
        </Disclosure>
        <PersonMenu />
      </div>
    </header>
  );
}
