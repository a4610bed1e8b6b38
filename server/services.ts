import type { Request } from 'express';
import passport from 'passport';
import type { Logger } from 'pino';
import type { Actor } from './audit/act.ts';
import { AuditService } from './audit/audit-service.ts';
import type { Config } from './config.ts';
import { ApiError } from './http/api-error.ts';
import { Health } from './http/health.ts';
import { MailboxCarrier } from './mail/mailbox-carrier.ts';
import { Outbox } from './mail/outbox.ts';
import { SmtpCarrier } from './mail/smtp-carrier.ts';
import type { Database } from './persistence/database.ts';
import { BrowserSession } from './session/browser-session.ts';
import { Csrf } from './session/csrf.ts';
import { PasswordHash } from './session/password-hash.ts';
import type { DemoAccount } from './session/session-endpoints.ts';
import { SessionStore } from './session/session-store.ts';
import { localStrategy } from './session/sessions.ts';
import { SignInService } from './session/sign-in-service.ts';
import { SignOutService } from './session/sign-out-service.ts';
import { AccountService } from './users/account-service.ts';
import { LinkMailLimit } from './users/link-mail-limit.ts';
import { PeopleService } from './users/people-service.ts';
import { RecoveryService } from './users/recovery-service.ts';
import { SetupService } from './users/setup-service.ts';

export type Services = ReturnType<typeof createServices>;

/** Everything the routes stand on, made once. */
export function createServices(
  config: Config,
  database: Database,
  mailboxFolder: string,
  logger: Logger,
) {
  const { origin, limits, now } = config;
  const hashes = new PasswordHash(config.scrypt);
  const signIns = new SignInService(database, hashes, limits);
  const { outbox, mailbox } = createMail(config, database, mailboxFolder, logger);
  const demo = { on: config.demo, accounts: [] as readonly DemoAccount[] };
  return {
    ...{ config, database, hashes, signIns, outbox, mailbox, demo },
    ...createSessions(config, database, signIns),
    health: new Health(database, config.dataFolder),
    audit: new AuditService(database),
    setup: new SetupService(database, hashes),
    signOuts: new SignOutService(database),
    account: new AccountService(database, hashes, signIns, outbox, origin),
    recovery: new RecoveryService(database, hashes, outbox, origin),
    people: new PeopleService(database, outbox, origin),
    linkMails: new LinkMailLimit(limits.linkMailsPerHour),
    now,
  };
}

function createMail(config: Config, database: Database, mailboxFolder: string, logger: Logger) {
  const mailbox = config.smtpUrl === null ? new MailboxCarrier(mailboxFolder, config.now) : null;
  const carrier = mailbox ?? new SmtpCarrier(config.smtpUrl ?? '', config.mailFrom);
  return { mailbox, outbox: new Outbox(database, carrier, config.now, logger) };
}

function createSessions(config: Config, database: Database, signIns: SignInService) {
  const csrf = new Csrf(config.origin, config.secure);
  const authenticator = new passport.Passport();
  authenticator.use(localStrategy(signIns, config.now));
  return {
    ...{ csrf, authenticator, browser: new BrowserSession(csrf) },
    sessions: new SessionStore(database, config.now),
    authenticate: (request: Request) => authenticate(authenticator, request),
  };
}

/** Asks passport's local strategy. */
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
