import { useSuspenseQuery } from '@tanstack/react-query';
import clsx from 'clsx';
import { Link, NavLink, useMatch } from 'react-router';
import { BrandMark } from '../components/BrandMark.tsx';
import { buttonClass } from '../components/Button.tsx';
import { HereNow } from '../features/presence/HereNow.tsx';
import { paths } from '../lib/paths.ts';
import { productionOptions } from '../lib/queries/production.ts';
import { sessionOptions } from '../lib/queries/session.ts';
import { PersonMenu } from './PersonMenu.tsx';
import { ProductionMenu } from './ProductionMenu.tsx';

const placesOf = (slug: string) => [
  { to: paths.feed(slug), label: 'Feed', end: true },
  { to: paths.sheet(slug), label: 'Shot sheet', end: false },
  { to: paths.people(slug), label: 'People', end: false },
];

/** The way around a production, who is here, and posting. */
export function Header({ slug }: { slug: string }) {
  const { data: production } = useSuspenseQuery(productionOptions(slug));
  const { data: session } = useSuspenseQuery(sessionOptions());
  const onTake = useMatch('/p/:slug/shots/:shotNumber/takes/:n') !== null;
  const posting = useMatch('/p/:slug/post') !== null;
  const places = placesOf(slug);

  return (
    <header className="border-b border-rule bg-sheet print:hidden">
      <div className="mx-auto flex h-12.5 max-w-[90rem] items-center gap-3 px-3.5 touch:h-14 lg:gap-6.5 lg:px-7">
        <Link
          to={paths.feed(slug)}
          className="flex items-center gap-2 font-display text-lg font-bold no-underline touch:min-h-11"
        >
          <BrandMark /> Spandrel
        </Link>
        <ProductionMenu production={production} session={session} />
        <nav aria-label="Production" className="hidden h-full gap-5 md:flex">
          {places.map((place) => (
            <NavLink
              key={place.to}
              to={place.to}
              end={place.end}
              className={({ isActive, isPending }) =>
                clsx(
                  'flex items-center font-medium whitespace-nowrap no-underline',
                  isActive ? 'text-ink shadow-[inset_0_-2px_0_var(--color-ink)]' : 'text-graphite hover:text-ink',
                  isPending && 'text-ink',
                )
              }
            >
              {place.label}
            </NavLink>
          ))}
        </nav>
        <span className="flex-1" />
        <HereNow slug={slug} me={session?.person.id} />
        {!posting && (
          <Link to={paths.post(slug)} className={buttonClass('primary')}>
            Post a strip
          </Link>
        )}
        {session && <PersonMenu person={session.person} places={places} />}
      </div>
      {!onTake && (
        <nav aria-label="Production, short" className="flex gap-1 border-t border-rule px-2 md:hidden">
          {places.map((place) => (
            <NavLink
              key={place.to}
              to={place.to}
              end={place.end}
              className={({ isActive }) =>
                clsx(
                  'flex min-h-11 flex-1 items-center justify-center px-2 font-medium whitespace-nowrap no-underline',
                  isActive ? 'text-ink shadow-[inset_0_-2px_0_var(--color-ink)]' : 'text-graphite',
                )
              }
            >
              {place.label}
            </NavLink>
          ))}
        </nav>
      )}
    </header>
  );
}
