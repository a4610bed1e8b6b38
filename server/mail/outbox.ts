import type { Logger } from 'pino';
import { LessThanOrEqual } from 'typeorm';
import type { Database } from '../persistence/database.ts';
import type { Carrier } from './carrier.ts';
import { OutgoingMailEntity } from './outgoing-mail-entity.ts';

const LOOK_EVERY_MS = 5000;
const FIRST_WAIT_MS = 60_000;
const LONGEST_WAIT_MS = 3_600_000;
const GIVE_UP_AFTER_MS = 48 * 3_600_000;
const AT_ONCE = 20;

/** Sends what has been queued, after its commit; tries again with growing waits, for two days. */
export class Outbox {
  #timer: NodeJS.Timeout | undefined;
  #round: Promise<void> = Promise.resolve();

  constructor(
    private readonly database: Database,
    private readonly carrier: Carrier,
    private readonly now: () => number,
    private readonly logger: Logger,
  ) {}

  start(): void {
    this.#timer = setInterval(() => {
      this.wake();
    }, LOOK_EVERY_MS);
  }

  /** Looks at once instead of at the next tick. */
  wake(): void {
    this.#round = this.#round
      .then(() => this.#deliver())
      .catch((error: unknown) => {
        this.logger.error({ event: 'outbox', err: error }, 'outbox could not be read');
      });
  }

  /** Resolves when everything due has been tried. */
  async settled(): Promise<void> {
    await this.#round;
  }

  async stop(): Promise<void> {
    clearInterval(this.#timer);
    await this.#round;
  }

  async #deliver(): Promise<void> {
    const due = await this.database.read((manager) =>
      manager.find(OutgoingMailEntity, {
        where: { nextAttemptAtMs: LessThanOrEqual(this.now()) },
        order: { createdAtMs: 'ASC' },
        take: AT_ONCE,
      }),
    );
    for (const mail of due) {
      const changes = await this.#try(mail);
      await this.database.transaction(async (manager) => {
        await manager.update(OutgoingMailEntity, mail.id, changes);
      });
    }
  }

  async #try(mail: OutgoingMailEntity): Promise<Partial<OutgoingMailEntity>> {
    const attempts = mail.attempts + 1;
    try {
      await this.carrier.carry(mail.id, mail);
      this.logger.info({ event: 'mail-sent', mailId: mail.id, attempts }, 'mail sent');
      return { attempts, sentAtMs: this.now(), nextAttemptAtMs: null, text: '' };
    } catch (error) {
      const waitMs = Math.min(FIRST_WAIT_MS * 2 ** mail.attempts, LONGEST_WAIT_MS);
      const over = this.now() - mail.createdAtMs > GIVE_UP_AFTER_MS;
      const reason = error instanceof Error ? error.message.slice(0, 256) : '';
      this.logger.error({ event: 'mail-failed', mailId: mail.id, attempts, reason }, 'mail failed');
      if (over) return { attempts, nextAttemptAtMs: null, text: '' };
      return { attempts, nextAttemptAtMs: this.now() + waitMs };
    }
  }
}
