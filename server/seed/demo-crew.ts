import { randomUUID } from 'node:crypto';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import type { Database } from '../persistence/database.ts';
import type { PasswordHash } from '../session/password-hash.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { DEMO_PEOPLE, type DemoRole } from './demo-accounts.ts';

const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;
/** The story ends well before the day the demo is first started on. */
const DAYS_AGO = 9;

/** The people of the demo acting at times of its own, some days ago. */
export class DemoCrew {
  private constructor(
    private readonly actors: Readonly<Record<DemoRole, Actor>>,
    private readonly firstDayMs: number,
  ) {}

  /** Makes the accounts. */
  static async gather(database: Database, hashes: PasswordHash, nowMs: number): Promise<DemoCrew> {
    const firstDayMs = Math.floor(nowMs / DAY_MS - DAYS_AGO) * DAY_MS;
    const actors = {} as Record<DemoRole, Actor>;
    for (const [role, { email, name, password }] of Object.entries(DEMO_PEOPLE)) {
      const actor = { id: randomUUID(), name, email, administrator: role === 'administrator' };
      const passwordHash = await hashes.hash(password);
      await database.transaction(async (manager) => {
        await manager.insert(PersonEntity, {
          ...{ ...actor, state: 'active', passwordHash, passwordVersion: 1, failedSignIns: 0 },
          ...{ createdAtMs: firstDayMs, lastSignInAtMs: null, version: 1 },
        });
        const act = { actor: null, requestId: 'demo', atMs: firstDayMs };
        await recordAudit(manager, act, {
          ...{ action: 'person.created', objectKind: 'person', objectId: actor.id },
          ...{ objectName: name, projectId: null, detail: { email, demo: true } },
          summary: `made the demo account of ${name}`,
        });
      });
      actors[role as DemoRole] = actor;
    }
    return new DemoCrew(actors, firstDayMs);
  }

  id(role: DemoRole): string {
    return this.actors[role].id;
  }

  /**
   * Somebody's act on one of the story's days.
   *
   * @param day 0 to 8
   * @param clock `14:30`, UTC
   */
  act(role: DemoRole, day: number, clock: string): Act<Actor> {
    const [hours = 0, minutes = 0] = clock.split(':').map(Number);
    const atMs = this.firstDayMs + day * DAY_MS + (hours * 60 + minutes) * MINUTE_MS;
    return { actor: this.actors[role], requestId: 'demo', atMs };
  }
}
