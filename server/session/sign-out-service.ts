import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import type { Database } from '../persistence/database.ts';

/** Leaves the trace of a sign-out; the session's record itself goes with its store. */
export class SignOutService {
  constructor(private readonly database: Database) {}

  async record(act: Act, actor: Actor): Promise<void> {
    await this.database.transaction((manager) =>
      recordAudit(manager, act, {
        ...{ action: 'session.ended', objectKind: 'person', objectId: actor.id },
        ...{ objectName: actor.name, projectId: null, summary: 'signed out', detail: {} },
      }),
    );
  }
}
