import passport from 'passport';
import type { Request } from 'express';
import type { Actor } from './audit/act.ts';
import type { Config } from './config.ts';
import { ApiError } from './http/api-error.ts';
import type { Database } from './persistence/database.ts';
import { BrowserSession } from './session/browser-session.ts';
import { Csrf } from './session/csrf.ts';
import { PasswordHash } from './session/password-hash.ts';
import { SessionStore } from './session/session-store.ts';
import { localStrategy } from './session/sessions.ts';
import { SignInService } from './session/sign-in-service.ts';
import { SignOutService } from './session/sign-out-service.ts';
import type { DemoAccount } from './session/session-endpoints.ts';
import { SetupService } from './users/setup-service.ts';

export type Services = ReturnType<typeof createServices>;

/** Everything the routes stand on, made once. */
export function createServices(
  config: Config,
  database: Database,
  demoAccounts: readonly DemoAccount[],
) {
  const hashes = new PasswordHash(config.scrypt);
  const signIns = new SignInService(database, hashes, config.limits);
  const csrf = new Csrf(config.origin, config.secure);
  const authenticator = new passport.Passport();
  authenticator.use(localStrategy(signIns, config.now));
  return {
    ...{ config, database, hashes, signIns, csrf, authenticator },
    setup: new SetupService(database, hashes),
    sessions: new SessionStore(database, config.now),
    signOuts: new SignOutService(database),
    browser: new BrowserSession(csrf),
    authenticate: (request: Request) => authenticate(authenticator, request),
    demo: { on: config.demo, accounts: demoAccounts },
  };
}

function authenticate(authenticator: passport.Authenticator, request: Request): Promise<Actor> {
  return new Promise((resolve, reject) => {
    const decided = (error: unknown, actor?: Actor | false): void => {
      if (error instanceof Error) reject(error);
      else if (actor) resolve(actor);
      else reject(new ApiError('wrong-credentials', 'E-mail or password is not right.'));
    };
    const run = authenticator.authenticate('local', decided) as (r: Request) => void;
    run(request);
  });
}
