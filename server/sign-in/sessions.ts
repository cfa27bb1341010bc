import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import type { Services } from '../http/services';
import type { SignedInUser } from '../http/signed-in-user';

/** Milliseconds without use after which a session is over. */
export const IDLE = 12 * 60 * 60 * 1000;

declare module 'express-session' {
  interface SessionData {
    /** When and with what the person signed in, for their own list of sessions. */
    startedAt?: string;
    userAgent?: string;
  }
}

/**
 * Sessions in PostgreSQL under a random id in a cookie that scripts cannot read. A session ends after
 * twelve idle hours: a technician's longest shift.
 */
export function sessions({ config, sessionPool }: Services): RequestHandler[] {
  const Store = connectPgSimple(session);
  const passports = new passport.Passport();
  passports.serializeUser((user, done) => {
    done(null, { personId: user.personId, organisationId: user.organisationId });
  });
  passports.deserializeUser((user: SignedInUser, done) => done(null, user));
  return [
    session({
      store: new Store({ pool: sessionPool, tableName: 'sessions', pruneSessionInterval: false }),
      name: config.secure ? '__Host-vatwright' : 'vatwright',
      secret: config.SESSION_SECRET,
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure: config.secure, maxAge: IDLE, path: '/' },
    }),
    passports.session() as RequestHandler,
  ];
}
