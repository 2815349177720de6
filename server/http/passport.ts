import passport from 'passport';
import { Strategy } from 'passport-local';
import type { Deps } from '../deps.ts';
import { findPerson, verifySignIn } from '../services/session.service.ts';

/** Passport with the local strategy; the session keeps a user's id and nothing else. */
export function createPassport(deps: Deps): passport.PassportStatic {
  const ours = new passport.Passport() as passport.PassportStatic;
  ours.use(
    new Strategy({ usernameField: 'email' }, (email, password, done) => {
      verifySignIn(deps, { email, password }).then(
        (user) => done(null, { id: user.id, name: user.name, initials: user.initials }),
        (error: unknown) => done(error),
      );
    }),
  );
  ours.serializeUser((user, done) => done(null, user.id));
  ours.deserializeUser((id: string, done) => {
    findPerson(deps, id).then(
      (person) => done(null, person ?? false),
      (error: unknown) => done(error),
    );
  });
  return ours;
}
