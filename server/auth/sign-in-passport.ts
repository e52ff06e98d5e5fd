import type { Request, Response } from 'express';
import { Passport, type PassportStatic } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import { checkCredentials } from './check-credentials';

declare global {
  namespace Express {
    interface User {
      readonly personId: string;
    }
  }
}

/** Passport with our one strategy: e-mail address and password. */
export const signInPassport: PassportStatic = createPassport();

/** The person whose e-mail address and password the body holds, or undefined. */
export function authenticateByBody(request: Request, response: Response): Promise<Express.User | undefined> {
  return new Promise((resolve, reject) => {
    const handler = signInPassport.authenticate(
      'local',
      { session: false },
      (error: unknown, user: Express.User | false | null) => {
        if (error) reject(error as Error);
        else resolve(user || undefined);
      },
    ) as (request: Request, response: Response, next: (error?: unknown) => void) => void;
    handler(request, response, (error) => reject(error as Error));
  });
}

function createPassport(): PassportStatic {
  const passport = new Passport() as PassportStatic;
  passport.serializeUser<string>((user, done) => done(null, user.personId));
  passport.deserializeUser<unknown>((personId, done) => {
    done(null, typeof personId === 'string' ? { personId } : false);
  });
  passport.use(
    new LocalStrategy({ usernameField: 'email', passwordField: 'password' }, (email, password, done) => {
      checkCredentials(email, password).then(
        (person) => done(null, person === undefined ? false : { personId: person.id }),
        (error: unknown) => done(error),
      );
    }),
  );
  return passport;
}
