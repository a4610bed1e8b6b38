import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';
import { FindingEntity } from './finding-entity.ts';

/** What was said to a finding. The table is append-only. */
@Entity({ name: 'finding_event' })
export class FindingEventEntity {
  @ManyToOne(() => FindingEntity, { nullable: false })
  @JoinColumn({ name: 'finding_id', foreignKeyConstraintName: 'finding_event_of_finding' })
  finding?: FindingEntity;

  @PrimaryColumn({ type: 'text', name: 'finding_id' }) findingId!: string;

  @PrimaryColumn({ type: 'integer' }) sequence!: number;

  @Column({ type: 'integer', name: 'at_ms' }) atMs!: number;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'finding_event_person' })
  person?: PersonEntity;

  @Column({ type: 'text', name: 'person_id' }) personId!: string;

  @Column({ type: 'text' }) act!: 'raised' | 'answered' | 'closed' | 'reopened';

  @Column({ type: 'text' }) text!: string;
}
