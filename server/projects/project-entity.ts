import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import { asBoolean } from '../persistence/boolean-column.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';

@Entity({ name: 'project' })
@Unique('project_code', ['code'])
export class ProjectEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @Column({ type: 'text' }) code!: string;

  @Column({ type: 'text' }) title!: string;

  @Column({ type: 'text', name: 'supplementary_title', nullable: true })
  supplementaryTitle!: string | null;

  @Column({ type: 'text', name: 'legal_owner' }) legalOwner!: string;

  @Column({ type: 'text', nullable: true }) department!: string | null;

  @ManyToOne(() => PolicyEntity, { nullable: false })
  @JoinColumn({ name: 'policy_id', foreignKeyConstraintName: 'project_policy' })
  policy?: PolicyEntity;

  @Column({ type: 'text', name: 'policy_id' }) policyId!: string;

  @Column({ type: 'integer', name: 'unverified_blocks_lock', transformer: asBoolean })
  unverifiedBlocksLock!: boolean;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'manager_id', foreignKeyConstraintName: 'project_manager' })
  manager?: PersonEntity;

  /** Who created it. */
  @Column({ type: 'text', name: 'manager_id' }) managerId!: string;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;

  @Column({ type: 'integer' }) version!: number;
}
