import type { Role } from '../../../shared/api/people.ts';

export interface DemoPerson {
  name: string;
  initials: string;
  email: string;
  role: Role;
}

export const DEMO_PRODUCTION = { slug: 'stilt-bakery', name: 'The Stilt Bakery' };

/** One phrase for everyone: it only ever opens a demo production in a database that was empty. */
export const DEMO_PASSWORD = 'flour and water';

/** Invented people. The first of each role is the one to try first. */
export const DEMO_PEOPLE = {
  sabela: { name: 'Sabela Quill', initials: 'SQ', email: 'sabela@stiltbakery.example', role: 'animator' },
  pim: { name: 'Pim Ardlow', initials: 'PA', email: 'pim@stiltbakery.example', role: 'animator' },
  wendel: { name: 'Wendel Marsh', initials: 'WM', email: 'wendel@stiltbakery.example', role: 'animator' },
  thea: { name: 'Thea Lindgate', initials: 'TL', email: 'thea@stiltbakery.example', role: 'mentor' },
  osric: { name: 'Osric Hane', initials: 'OH', email: 'osric@stiltbakery.example', role: 'mentor' },
  mirela: { name: 'Mirela Copse', initials: 'MC', email: 'mirela@stiltbakery.example', role: 'producer' },
  dagny: { name: 'Dagny Furrow', initials: 'DF', email: 'dagny@stiltbakery.example', role: 'owner' },
} satisfies Record<string, DemoPerson>;
export type DemoPersonKey = keyof typeof DEMO_PEOPLE;
