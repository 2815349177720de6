import { useState } from 'react';
import { useNavigate } from 'react-router';
import { useQuery } from '@tanstack/react-query';
import type { Person } from '../../shared/api/people.ts';
import { ErrorNote } from '../components/ErrorNote.tsx';
import { InkRing } from '../components/InkRing.tsx';
import { Menu, type MenuItem } from '../components/Menu.tsx';
import { useSignOut } from '../features/session/useSignOut.ts';
import { sentenceOf } from '../lib/ApiProblem.ts';
import { paths } from '../lib/paths.ts';
import { sessionOptions } from '../lib/queries/session.ts';
import { type ThemeChoice, chooseTheme, chosenTheme } from '../lib/theme.ts';
import { useMediaQuery } from '../lib/useMediaQuery.ts';
import { openKeyList } from './openKeyList.ts';

const THEMES: { choice: ThemeChoice; label: string }[] = [
  { choice: 'system', label: 'As the system' },
  { choice: 'light', label: 'Light' },
  { choice: 'dark', label: 'Dark' },
];

export interface PersonMenuProps {
  person: Person;
  places: { to: string; label: string }[];
}

/** The one who is signed in: theme, keys, signing out; on a phone also the way around. */
export function PersonMenu({ person, places }: PersonMenuProps) {
  const navigate = useNavigate();
  const signOut = useSignOut(() => navigate(paths.signIn()));
  const { data: session } = useQuery(sessionOptions());
  const [theme, setTheme] = useState<ThemeChoice>(chosenTheme);
  const narrow = useMediaQuery('(max-width: 63.99rem)');
  const productions = session?.productions ?? [];

  const ways: MenuItem[] = narrow
    ? places.map((place) => ({ label: place.label, run: () => void navigate(place.to) }))
    : [];
  const others: MenuItem[] =
    narrow && productions.length > 1
      ? productions.map((one, index) => ({
          label: one.name,
          run: () => void navigate(paths.feed(one.slug)),
          under: index === 0 ? 'Productions' : undefined,
        }))
      : [];
  const themes: MenuItem[] = THEMES.map(({ choice, label }, index) => ({
    label,
    checked: theme === choice,
    under: index === 0 ? 'Theme' : undefined,
    run: () => {
      chooseTheme(choice);
      setTheme(choice);
    },
  }));

  return (
    <>
      <Menu
        label={`${person.initials}, ${person.name}: menu`}
        align="end"
        className="inline-grid min-h-9 min-w-9 place-items-center rounded-control hover:bg-well touch:min-h-11 touch:min-w-11"
        items={[
          ...ways,
          ...others,
          ...themes,
          { label: 'Keys on this screen', run: openKeyList, under: person.name },
          { label: 'Sign out', run: () => signOut.mutate() },
        ]}
      >
        <InkRing person={person} named />
      </Menu>
      {signOut.isError && (
        <ErrorNote className="fixed top-14 right-3 z-40">
          You are still signed in. {sentenceOf(signOut.error)}
        </ErrorNote>
      )}
    </>
  );
}
