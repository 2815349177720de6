import type { PersonParts } from '../presenters/people.presenter.ts';

declare global {
  namespace Express {
    /** Who is signed in, as Passport puts it on a request. */
    interface User extends PersonParts {}
  }
}
