import type { EntityManager } from 'typeorm';
import type { Move } from '../../shared/review/revision-state.ts';
import type { Act, Actor } from '../audit/act.ts';
import type { Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { columnsOf, judge } from './judge.ts';
import { snapshotParts } from './part-snapshot.ts';
import { permit } from './permit.ts';
import { auditRevision } from './revision-audit.ts';
import { openRevision, type RevisionContext } from './revision-context.ts';
import { answerRevision, type RevisionAnswer } from './revision-reply.ts';
import { addHand, makeMove } from './revision-write.ts';

/** Moves a revision through the review; locking has a service of its own. */
export class WorkflowService {
  constructor(private readonly database: Database) {}

  /** Freezes definition and part data and stores the server's own result. */
  async submit(act: Act<Actor>, revisionId: string, ifMatch: Versioned): Promise<RevisionAnswer> {
    const { context, policy } = await this.#look(act, revisionId, 'submit', ifMatch);
    const judged = judge(context.revision.definition, policy);
    return this.#move(act, revisionId, 'submit', ifMatch, async (manager, now) => {
      const partSnapshot = await snapshotParts(manager, revisionId);
      await addHand(manager, revisionId, act.actor.id, 'author');
      await makeMove(manager, act, now, 'submit', {
        columns: { ...columnsOf(judged), partSnapshot, savedAtMs: act.atMs },
      });
      await auditRevision(
        manager,
        act,
        now,
        'revision.submitted',
        (name) => `submitted ${name} for check`,
        { verdict: judged.verdict, engine: judged.evaluation.engine },
      );
    });
  }

  /** Refused while anything is missing in the check. */
  pass(act: Act<Actor>, revisionId: string, ifMatch: Versioned): Promise<RevisionAnswer> {
    return this.#move(act, revisionId, 'pass', ifMatch, async (manager, now) => {
      await addHand(manager, revisionId, act.actor.id, 'checker');
      await makeMove(manager, act, now, 'pass');
      await auditRevision(manager, act, now, 'revision.passed', (name) => `passed ${name}`, {
        overdriveFactor: now.check?.overdriveFactor ?? null,
      });
    });
  }

  /** Back to draft: from In check by a checker, from Checked by an approver. */
  async giveBack(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    reason: string,
  ): Promise<RevisionAnswer> {
    const { context, policy } = await this.#look(act, revisionId, 'return', ifMatch);
    const move = context.revision.state === 'checked' ? 'send-back' : 'return';
    // the project may have adopted another policy while this revision was frozen
    const judged = judge(context.revision.definition, policy);
    return this.#move(act, revisionId, move, ifMatch, async (manager, now) => {
      if (move === 'return') await addHand(manager, revisionId, act.actor.id, 'checker');
      const columns = { ...columnsOf(judged), partSnapshot: null };
      await makeMove(manager, act, now, move, { reason, columns });
      await auditRevision(
        manager,
        act,
        now,
        move === 'return' ? 'revision.returned' : 'revision.sent-back',
        (name) => `returned ${name}`,
        { reason, openFindings: now.findings.filter(({ state }) => state !== 'closed').length },
      );
    });
  }

  withdraw(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    reason: string,
  ): Promise<RevisionAnswer> {
    return this.#move(act, revisionId, 'withdraw', ifMatch, async (manager, now) => {
      await makeMove(manager, act, now, 'withdraw', { reason });
      await auditRevision(manager, act, now, 'revision.withdrawn', (name) => `withdrew ${name}`, {
        reason,
      });
    });
  }

  /** A first look outside of the transaction, so that nothing is computed for what will be refused. */
  #look(act: Act<Actor>, revisionId: string, move: 'submit' | 'return', ifMatch: Versioned) {
    return this.database.read(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      const back = context.revision.state === 'checked' ? 'send-back' : 'return';
      permit(context, move === 'return' ? back : move, ifMatch);
      const { policyId } = context.access.project;
      return { context, policy: await manager.findOneByOrFail(PolicyEntity, { id: policyId }) };
    });
  }

  #move(
    act: Act<Actor>,
    revisionId: string,
    move: Move,
    ifMatch: Versioned,
    work: (manager: EntityManager, now: RevisionContext) => Promise<void>,
  ): Promise<RevisionAnswer> {
    return this.database.transaction(async (manager) => {
      const now = await openRevision(manager, act.actor, revisionId);
      permit(now, move, ifMatch);
      await work(manager, now);
      return answerRevision(manager, act.actor, revisionId);
    });
  }
}
