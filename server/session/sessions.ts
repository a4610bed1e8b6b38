import '../http/express-user.ts';
import type { RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy } from 'passport-local';
import type { Actor } from '../audit/act.ts';
import type { Config } from '../config.ts';
import type { Database } from '../persistence/database.ts';
import { requestIdOf } from '../http/request-log.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { actorOf, type SignInService } from './sign-in-service.ts';
import type { SessionStore } from './session-store.ts';

/** The cookie's name: the `__Host-` prefix binds it to https, this host and all paths. */
export function cookieName(secure: boolean): string {
  return secure ? '__Host-sid' : 'sid';
}

/** Reads the session cookie and the person behind it, anew for each request. */
export function sessions(
  config: Config,
  secrets: readonly string[],
  database: Database,
  store: SessionStore,
  authenticator: passport.Authenticator,
): RequestHandler[] {
  authenticator.serializeUser<string>((user, done) => {
    done(null, user.id);
  });
  authenticator.deserializeUser<string>((id, done) => {
    findActive(database, id).then(
      (actor) => {
        done(null, actor ?? false);
      },
      (error: unknown) => {
        done(error);
      },
    );
  });
  return [
    session({
      store,
      name: cookieName(config.secure),
      secret: [...secrets],
      proxy: config.secure, // TLS ends at the proxy that SINKWELL_URL declares
      resave: false,
      saveUninitialized: false,
      cookie: { httpOnly: true, sameSite: 'lax', secure: config.secure, path: '/' },
    }),
    authenticator.session() as RequestHandler,
  ];
}

/** passport-local on top of the sign-in service. */
export function localStrategy(signIns: SignInService, now: () => number): Strategy {
  return new Strategy(
    { usernameField: 'email', passReqToCallback: true },
    (request, email, password, done) => {
      const act = { actor: null, requestId: requestIdOf(request), atMs: now() };
      signIns.signIn(act, email, password, request.ip ?? '').then(
        (actor) => {
          done(null, actor);
        },
        (error: unknown) => {
          done(error);
        },
      );
    },
  );
}

async function findActive(database: Database, id: string): Promise<Actor | null> {
  const person = await database.read((manager) => manager.findOneBy(PersonEntity, { id }));
  return person?.state === 'active' ? actorOf(person) : null;
}
