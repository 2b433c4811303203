import passportModule from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import { findPersonByEmail } from '../../db/queries/people';
import type { Context } from '../context';
import { passwordFits } from './passwords';

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- passport's types are extended in this way only
  namespace Express {
    interface User {
      personId: string;
    }
  }
}

export type AppPassport = InstanceType<typeof passportModule.Passport>;

/** One passport per context, so that tests run side by side. Sessions keep the person's id and nothing else. */
export function createPassport(context: Context): AppPassport {
  const passport = new passportModule.Passport();
  passport.use(
    new LocalStrategy({ usernameField: 'email', passwordField: 'password' }, (email, password, done) => {
      const person = findPersonByEmail(context.db, email.trim());
      passwordFits(person?.passwordHash, password).then(
        (fits) => done(null, fits && person ? { personId: person.id } : false),
        (error: unknown) => done(error),
      );
    }),
  );
  passport.serializeUser((user, done) => done(null, user.personId));
  passport.deserializeUser((personId: string, done) => done(null, { personId }));
  return passport;
}
