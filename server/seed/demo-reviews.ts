import { StageInput } from '../../shared/stage/stage-input.ts';
import type { Database } from '../persistence/database.ts';
import { DraftService } from '../revisions/draft-service.ts';
import { startNextRevision } from '../revisions/next-revision.ts';
import type { DemoCrew } from './demo-crew.ts';
import type { DemoDesk } from './demo-desk.ts';
import type { DemoSchedule, DemoThread, When } from './demo-schedule.ts';
import type { DemoStage } from './demo-stages.ts';

/** Ways a stage of one project goes through the review, each planned as one thread. */
export class DemoReviews {
  readonly #drafts: DraftService;

  constructor(
    private readonly database: Database,
    private readonly crew: DemoCrew,
    private readonly desk: DemoDesk,
    private readonly schedule: DemoSchedule,
    private readonly projectId: string,
  ) {
    this.#drafts = new DraftService(database);
  }

  draft(stage: DemoStage, when: When): DemoThread {
    return this.schedule.thread().begin(when, (now) => this.desk.draft(this.projectId, stage, now));
  }

  submitted(stage: DemoStage, drafted: When, submitted: When): DemoThread {
    return this.draft(stage, drafted).next(submitted, (before, now) =>
      this.desk.submit(before, now),
    );
  }

  /** @param off how far the checker's own figure lies from the tool's, as a fraction */
  checked(stage: DemoStage, day: number, hour: string, off: number): DemoThread {
    const thread = this.submitted(stage, [day, `${hour}:05`], [day, `${hour}:40`]);
    return this.#check(thread, day + 1, hour, off);
  }

  locked(stage: DemoStage, day: number, hour: string, off: number): DemoThread {
    const thread = this.submitted(stage, [day, `${hour}:00`], [day, `${hour}:50`]);
    return this.#check(thread, day, '14', off).next([day, '16:05'], (before, now) =>
      this.desk.lock(before, now),
    );
  }

  /** The next revision of a locked stage with another base resistor, locked in its turn. */
  revised(first: DemoThread, baseResistorOhm: number, day: number): DemoThread {
    const act = (clock: string) => this.crew.act('designer', day, clock);
    const thread = this.schedule
      .thread()
      .begin([day, '08:40'], () =>
        startNextRevision(this.database, act('08:40'), first.answer.body.stageId),
      )
      .next([day, '09:20'], ({ body, etag }) => {
        const definition = StageInput.parse(body.definition);
        const baseResistor = { ...definition.baseResistor, valueOhm: baseResistorOhm };
        const { designators, parts } = body;
        return this.#drafts.save(act('09:20'), body.id, etag, {
          ...{ designators, parts },
          definition: { ...definition, baseResistor },
        });
      })
      .next([day, '10:00'], (before, now) => this.desk.submit(before, now));
    return this.#check(thread, day, '14', 0.018).next([day, '16:20'], (before, now) =>
      this.desk.lock(before, now),
    );
  }

  /** A check half done. */
  begun(stage: DemoStage): DemoThread {
    return this.submitted(stage, [6, '10:15'], [7, '13:20']).next([7, '15:45'], (before, now) =>
      this.desk.check(before, now, { off: 0.007, reads: 12 }),
    );
  }

  withdrawn(stage: DemoStage): DemoThread {
    return this.draft(stage, [2, '11:00']).next([3, '08:15'], ({ body, etag }, [day, clock]) =>
      this.desk.workflow.withdraw(
        this.crew.act('designer', day, clock),
        body.id,
        etag,
        'The output is not fitted on this board.',
      ),
    );
  }

  /** Back to draft with an open finding. */
  returned(stage: DemoStage): DemoThread {
    return this.submitted(stage, [5, '08:20'], [5, '09:00'])
      .next([6, '15:02'], (before, now) =>
        this.desk.raise(before, now, {
          subject: { kind: 'criterion', id: 'load-voltage' },
          title: 'Must-operate voltage of the valve is missing',
          text: 'Without it nobody can say whether the valve opens at 21.6 V.',
        }),
      )
      .next([6, '15:10'], ({ body, etag }, [day, clock]) =>
        this.desk.workflow.giveBack(
          this.crew.act('checker', day, clock),
          body.id,
          etag,
          'One finding: the coil data are not complete.',
        ),
      );
  }

  /** One finding closed, one answered and waiting for the checker. */
  withFindings(stage: DemoStage): DemoThread {
    const { desk } = this;
    return this.submitted(stage, [6, '11:00'], [6, '11:30'])
      .next([6, '14:05'], (before, now) =>
        desk.raise(before, now, {
          subject: { kind: 'field', id: 'shuntResistor.ratingW' },
          title: 'Rating of RBE: which size is fitted?',
          text: 'The board list names two sizes for the same value.',
        }),
      )
      .next([6, '14:12'], (before, now) =>
        desk.raise(before, now, {
          subject: { kind: 'criterion', id: 'drive-current' },
          title: 'Pin current of port PB counted twice?',
          text: 'The port total seems to hold this stage twice.',
        }),
      )
      .next([7, '09:05'], (before, now) =>
        desk.say(before, now, 1, 'answered', 'The larger one, 0.1 W; the board list is put right.'),
      )
      .next([7, '10:20'], (before, now) =>
        desk.say(before, now, 1, 'closed', 'Seen in the board list.'),
      )
      .next([7, '11:48'], (before, now) =>
        desk.say(
          before,
          now,
          2,
          'answered',
          'Quantity is one; the second entry was another stage of the same port.',
        ),
      );
  }

  #check(thread: DemoThread, day: number, hour: string, off: number): DemoThread {
    return thread
      .next([day, `${hour}:10`], (before, now) => this.desk.check(before, now, { off }))
      .next([day, `${hour}:30`], (before, now) => this.desk.pass(before, now));
  }
}
