import { BomNoteService } from '../bom-notes/bom-note-service.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { ProjectService } from '../projects/project-service.ts';
import { DEMO_WORKSPACE } from './demo-accounts.ts';
import type { DemoCrew } from './demo-crew.ts';
import type { DemoDesk } from './demo-desk.ts';
import { demoRelay } from './demo-relay.ts';
import { DemoReviews } from './demo-reviews.ts';
import { DemoSchedule, type DemoThread } from './demo-schedule.ts';
import { COLD_ROOM, IRRIGATION } from './demo-stages.ts';

/** Nine days in the life of two projects: every state, every verdict, findings, a revision after a lock. */
export class DemoStory {
  readonly #schedule = new DemoSchedule();

  constructor(
    private readonly database: Database,
    private readonly crew: DemoCrew,
    private readonly desk: DemoDesk,
  ) {}

  async tell(): Promise<void> {
    const coldRoom = await this.#project(
      'CR-40',
      'Cold-room controller, relay board',
      'General practice',
      '08',
    );
    const irrigation = await this.#project(
      'IR-8',
      'Irrigation controller, valve board',
      'High reliability',
      '09',
    );
    this.#library();
    this.#coldRoom(coldRoom);
    this.#irrigation(irrigation);
    await this.#schedule.run();
  }

  async #project(code: string, title: string, policyName: string, hour: string): Promise<string> {
    const projects = new ProjectService(this.database);
    const policy = await this.database.read((manager) =>
      manager.findOneByOrFail(PolicyEntity, { name: policyName, version: 1 }),
    );
    const made = await projects.create(this.crew.act('designer', 0, `${hour}:30`), {
      ...{ code, title, supplementaryTitle: null, legalOwner: DEMO_WORKSPACE },
      ...{ department: 'Electronics', policyId: policy.id, unverifiedBlocksLock: false },
    });
    const roles = ['designer', 'checker', 'approver', 'exporter'] as const;
    const members = roles.map((role) => ({ personId: this.crew.id(role), roles: [role] }));
    const act = this.crew.act('designer', 0, `${hour}:35`);
    await projects.saveMembers(act, made.body.id, made.etag, members);
    return made.body.id;
  }

  /** Three parts are verified; an invented relay comes in, and changes after a stage with it is locked. */
  #library(): void {
    const { desk } = this;
    for (const [index, part] of ['2N3904', '2N3906', '2N4401'].entries()) {
      const clock = `10:${10 + 5 * index}`;
      this.#schedule.at([0, clock], () => desk.verifyPart(part, [0, clock]));
    }
    this.#schedule.at([0, '11:20'], () =>
      desk.addPart(demoRelay(14.4), 'Entered from issue 1 of the invented sheet.', [0, '11:20']),
    );
    const change = 'Issue 2 of the invented sheet: must-operate 15.6 V instead of 14.4 V.';
    this.#schedule.at([8, '10:05'], () => desk.revisePart(demoRelay(15.6), change, [8, '10:05']));
  }

  #coldRoom(projectId: string): void {
    const reviews = new DemoReviews(this.database, this.crew, this.desk, this.#schedule, projectId);
    const fan = reviews.locked(COLD_ROOM.fan, 1, '09', 0.012);
    const locked = [
      reviews.locked(COLD_ROOM.compressor, 1, '08', -0.031),
      reviews.locked(COLD_ROOM.defrost, 2, '08', 0.02),
      reviews.locked(COLD_ROOM.sounder, 2, '09', -0.014),
      reviews.locked(COLD_ROOM.condenser, 3, '09', 0.061),
      reviews.revised(fan, 390, 4),
      reviews.locked(COLD_ROOM.suction, 3, '08', 0.024),
      reviews.locked(COLD_ROOM.fanSpeed, 4, '10', -0.008),
      reviews.locked(COLD_ROOM.doorOpen, 2, '10', 0),
    ];
    this.#note(projectId, locked);
    reviews.checked(COLD_ROOM.drain, 5, '09', -0.022);
    reviews.checked(COLD_ROOM.status, 5, '10', 0.009);
    reviews.begun(COLD_ROOM.doorFrame);
    reviews.submitted(COLD_ROOM.liquidLine, [5, '14:00'], [5, '16:40']);
    reviews.withFindings(COLD_ROOM.supervisory);
    reviews.returned(COLD_ROOM.humidifier);
    reviews.withdrawn(COLD_ROOM.spare);
    reviews.checked(COLD_ROOM.water, 5, '08', 0.011);
    reviews.submitted(COLD_ROOM.pilotLamp, [6, '09:15'], [6, '09:50']);
    reviews.draft(COLD_ROOM.frame, [7, '14:20']);
    reviews.draft(COLD_ROOM.roomLight, [7, '15:10']);
    reviews.draft(COLD_ROOM.agitator, [8, '08:30']);
  }

  #irrigation(projectId: string): void {
    const reviews = new DemoReviews(this.database, this.crew, this.desk, this.#schedule, projectId);
    reviews.locked(IRRIGATION.master, 3, '08', -0.017);
    reviews.checked(IRRIGATION.panel, 4, '11', 0.004);
    reviews.draft(IRRIGATION.zone2, [6, '16:20']);
    reviews.draft(IRRIGATION.pump, [7, '16:00']);
    reviews.submitted(IRRIGATION.zone3, [6, '13:10'], [6, '15:30']);
    reviews.draft(IRRIGATION.running, [7, '10:45']);
    reviews.submitted(IRRIGATION.zone1, [7, '08:50'], [8, '09:15']);
  }

  #note(projectId: string, locked: readonly DemoThread[]): void {
    const notes = new BomNoteService(this.database);
    this.#schedule.at([5, '11:15'], async () => {
      const ids = locked.map(({ answer }) => answer.body.id);
      await notes.issue(this.crew.act('exporter', 5, '11:15'), projectId, ids);
    });
  }
}
