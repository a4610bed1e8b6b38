import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { ProjectRole } from '../../shared/review/revision-state.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { ProjectEntity } from './project-entity.ts';

/** A person on a project, with one or more roles. */
@Entity({ name: 'membership' })
@Index('membership_by_person', ['personId'])
export class MembershipEntity {
  @ManyToOne(() => ProjectEntity, { nullable: false })
  @JoinColumn({ name: 'project_id', foreignKeyConstraintName: 'membership_of_project' })
  project?: ProjectEntity;

  @PrimaryColumn({ type: 'text', name: 'project_id' }) projectId!: string;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'membership_of_person' })
  person?: PersonEntity;

  @PrimaryColumn({ type: 'text', name: 'person_id' }) personId!: string;

  @Column({ type: 'simple-json' }) roles!: ProjectRole[];
}
