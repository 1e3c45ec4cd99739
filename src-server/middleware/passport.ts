import passport, { type PassportStatic } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Account } from '#contract';
import { findAccount } from '../repositories/people';
import type { ServerContext } from '../services/context';
import { signIn } from '../services/people';

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the way in which Express lets its types be extended
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- the user of a request is an account, nothing else
    interface User extends Account {}
  }
}

/** Sign-in by name and password; the account is read anew at every request, so that a deactivated person is out at once. */
export function configurePassport(context: ServerContext): PassportStatic {
  const instance = new passport.Passport() as unknown as PassportStatic;
  instance.use(
    new LocalStrategy({ usernameField: 'signInName', passwordField: 'password' }, (signInName, password, done) => {
      signIn(context, signInName, password).then((account) => done(null, account ?? false), done);
    }),
  );
  instance.serializeUser((user, done) => done(null, user.id));
  instance.deserializeUser((id: string, done) => {
    findAccount(context.db, id).then((account) => done(null, account?.active === true ? account : false), done);
  });
  return instance;
}
