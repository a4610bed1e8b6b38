import type { Evaluation } from '../../shared/checks/evaluation.ts';
import type { PartRecord } from '../../shared/parts/part-record.ts';
import { deriveTransistor } from '../../shared/parts/derive-transistor.ts';
import { CheckService } from '../checks/check-service.ts';
import { FindingService } from '../checks/finding-service.ts';
import { PartService } from '../parts/part-service.ts';
import type { Database } from '../persistence/database.ts';
import { LockService } from '../revisions/lock-service.ts';
import type { RevisionAnswer } from '../revisions/revision-reply.ts';
import { WorkflowService } from '../revisions/workflow-service.ts';
import { StageService } from '../stages/stage-service.ts';
import { DEMO_PEOPLE } from './demo-accounts.ts';
import type { DemoCrew } from './demo-crew.ts';
import type { When } from './demo-schedule.ts';
import { demoDefinition, type DemoStage } from './demo-stages.ts';

const LOOPBACK = '127.0.0.1';

/** The steps of the review as the demo's people take them, all through the services. */
export class DemoDesk {
  readonly workflow: WorkflowService;
  readonly #parts: PartService;
  readonly #findings: FindingService;
  readonly #stages: StageService;
  readonly #checks: CheckService;
  readonly #locks: LockService;

  constructor(
    database: Database,
    private readonly crew: DemoCrew,
  ) {
    this.workflow = new WorkflowService(database);
    this.#parts = new PartService(database);
    this.#findings = new FindingService(database);
    this.#stages = new StageService(database);
    this.#checks = new CheckService(database);
    // the passwords are the demo's own: hashing them seven times would only delay the first start
    this.#locks = new LockService(database, { verifyPassword: () => Promise.resolve() });
  }

  /** A stage filled from the library. */
  async draft(projectId: string, stage: DemoStage, [day, clock]: When): Promise<RevisionAnswer> {
    const transistor = await this.#transistor(stage.transistor);
    const { preDriver } = stage;
    const front = preDriver === undefined ? null : await this.#transistor(preDriver.transistor);
    const load = stage.load === undefined ? null : await this.#latest(stage.load);
    const link = (id: string) => ({ partRevisionId: id, choice: {} });
    const made = await this.#stages.create(this.crew.act('designer', day, clock), projectId, {
      definition: demoDefinition(stage, (number) =>
        number === preDriver?.transistor && front !== null ? front.data : transistor.data,
      ),
      designators: { preDriver: preDriver?.designator ?? null },
      parts: {
        transistor: link(transistor.id),
        preDriver: front && link(front.id),
        load: load && link(load.id),
      },
    });
    return { body: made.body.revision, etag: made.etag };
  }

  submit({ body, etag }: RevisionAnswer, [day, clock]: When): Promise<RevisionAnswer> {
    return this.workflow.submit(this.crew.act('designer', day, clock), body.id, etag);
  }

  /**
   * The checker's own figure by hand, everything asked for justified and read.
   *
   * @param off how far the own figure lies from the tool's, as a fraction
   * @param reads how many criteria have been read; all of them where left out
   */
  check(
    { body, etag }: RevisionAnswer,
    [day, clock]: When,
    { off, reads }: { readonly off: number; readonly reads?: number },
  ): Promise<RevisionAnswer> {
    const { criteria } = body.evaluation;
    const asked = criteria.filter(({ status }) => status === 'marginal' || status === 'open');
    const half = reads !== undefined;
    return this.#checks.save(this.crew.act('checker', day, clock), body.id, etag, {
      overdriveFactor: ownFigure(body.evaluation, off),
      method: 'hand',
      note: 'Gain at the coil current read from the printed rows, cold factor by the policy’s exponent, base current from the weak output.',
      reason:
        Math.abs(off) > 0.05
          ? 'Rounded gain taken between the printed rows; the tool interpolates on logarithmic axes.'
          : '',
      justifications: half
        ? {}
        : Object.fromEntries(asked.map(({ id }) => [id, JUSTIFIED[id] ?? JUSTIFIED.other])),
      read: criteria.slice(0, reads ?? criteria.length).map(({ id }) => id),
    });
  }

  raise(
    { body, etag }: RevisionAnswer,
    [day, clock]: When,
    finding: Parameters<FindingService['raise']>[3],
  ): Promise<RevisionAnswer> {
    return this.#findings.raise(this.crew.act('checker', day, clock), body.id, etag, finding);
  }

  /** The designer answers a finding, or the checker closes it. */
  say(
    { body, etag }: RevisionAnswer,
    [day, clock]: When,
    number: number,
    said: 'answered' | 'closed',
    text: string,
  ): Promise<RevisionAnswer> {
    const findingId = body.findings.find((finding) => finding.number === number)?.id ?? '';
    const act = this.crew.act(said === 'answered' ? 'designer' : 'checker', day, clock);
    return this.#findings.say(act, { revisionId: body.id, findingId }, etag, said, text);
  }

  pass({ body, etag }: RevisionAnswer, [day, clock]: When): Promise<RevisionAnswer> {
    return this.workflow.pass(this.crew.act('checker', day, clock), body.id, etag);
  }

  async lock({ body, etag }: RevisionAnswer, [day, clock]: When): Promise<RevisionAnswer> {
    const act = this.crew.act('approver', day, clock);
    const { hash } = await this.#locks.preview(act.actor, body.id);
    const { password } = DEMO_PEOPLE.approver;
    return this.#locks.lock(act, body.id, etag, { password, hash }, LOOPBACK);
  }

  async addPart(record: PartRecord, comment: string, [day, clock]: When): Promise<void> {
    await this.#parts.create(this.crew.act('designer', day, clock), { record, comment });
  }

  async revisePart(record: PartRecord, comment: string, [day, clock]: When): Promise<void> {
    const act = this.crew.act('designer', day, clock);
    const { partId } = await this.#latest(record.partNumber);
    const { etag } = await this.#parts.read(act.actor, partId);
    await this.#parts.revise(act, partId, etag, { record, comment });
  }

  /** The checker reads the rows of a part back against its own first document. */
  async verifyPart(partNumber: string, [day, clock]: When): Promise<void> {
    const { id, record } = await this.#latest(partNumber);
    await this.#parts.verify(this.crew.act('checker', day, clock), id, {
      document: record.documents[0]?.title.slice(0, 200) ?? record.partNumber,
      note: 'Demo: shown as read back row by row. Read the sheet yourself before you rely on it.',
    });
  }

  async #transistor(partNumber: string) {
    const { id, record } = await this.#latest(partNumber);
    if (record.kind !== 'transistor') throw new Error(`no ${partNumber}`);
    const derived = deriveTransistor(record);
    if (!derived.ok) throw new Error(derived.reason);
    return { id, data: derived.data };
  }

  async #latest(partNumber: string) {
    const { parts } = await this.#parts.list({
      ...{ search: partNumber, sort: 'partNumber', direction: 'asc', page: 1, pageSize: 500 },
    });
    const row = parts.find((part) => part.partNumber === partNumber);
    if (row === undefined) throw new Error(`the library has no ${partNumber}`);
    return (await this.#parts.readRevision(row.latestRevisionId)).body;
  }
}

const JUSTIFIED: Readonly<Record<string, string>> & { readonly other: string } = {
  'load-voltage':
    'The panel heater holds the supply above 22 V in service; on the bench the contactor pulled in at 19.4 V and 60 °C.',
  'peak-collector-voltage':
    'The supply is limited to 26.4 V by its own regulator; 27.4 V was the highest value seen on the bench.',
  other: 'Looked at on the bench and found sufficient for this board.',
};

function ownFigure({ criteria }: Evaluation, off: number): number | null {
  const tool = criteria.find(({ id }) => id === 'overdrive-factor')?.value ?? null;
  return tool === null ? null : Number((tool * (1 + off)).toPrecision(3));
}
