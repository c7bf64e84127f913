import { useQuery } from '@tanstack/react-query';
import { Link, NavLink, useLocation } from 'react-router';
import { type Action, can } from '#shared/access/roles.ts';
import { me } from '#src/api/session.ts';
import { SearchField } from '#src/features/search/search-field.tsx';
import { PersonMenu } from '#src/features/session/person-menu.tsx';
import { cx } from '#src/lib/class-names.ts';

const places: readonly { to: string; label: string; action: Action }[] = [
  { to: '/', label: 'Library', action: 'read-manuals' },
  { to: '/people', label: 'People', action: 'manage-people' },
  { to: '/outbox', label: 'Outbox', action: 'see-outbox' },
  { to: '/audit', label: 'Audit trail', action: 'see-audit' },
];

export function TopBar() {
  const { data: person } = useQuery(me);
  const open = places.filter(({ action }) => person && can(person.role, action));
  // The search screen has a field of its own.
  const isSearching = useLocation().pathname === '/search';
  return (
    <header className="screen-only border-b border-ink bg-paper">
      <div className="mx-auto flex max-w-[1240px] flex-wrap items-center gap-x-6 gap-y-1 px-4 py-2 sm:px-6">
        <Link to="/" className="font-serif text-lead font-semibold">
          Benchleaf
        </Link>
        <nav
          aria-label="Places"
          className={cx(
            'order-3 flex flex-wrap gap-x-1 md:order-none',
            open.length > 1 ? 'max-md:w-full' : 'max-md:hidden',
          )}
        >
          {open.map(({ to, label }) => (
            <Place key={to} to={to} label={label} />
          ))}
        </nav>
        <div className="order-4 min-w-0 flex-1 basis-full md:order-none md:basis-60">
          {isSearching ? null : <SearchField />}
        </div>
        {person ? (
          <div className="ml-auto">
            <PersonMenu person={person} />
          </div>
        ) : null}
      </div>
    </header>
  );
}

function Place({ to, label }: { to: string; label: string }) {
  return (
    <NavLink
      to={to}
      end
      className={({ isActive }) =>
        cx(
          'border-b-2 px-2 py-1 first:max-md:pl-0 hover:border-edge',
          isActive
            ? 'border-ink font-semibold text-ink hover:border-ink'
            : 'border-transparent text-pencil hover:text-ink',
        )
      }
    >
      {label}
    </NavLink>
  );
}
