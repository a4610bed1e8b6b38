import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import { ProjectEntity } from '../projects/project-entity.ts';

/** A place on the board: one designator of a project, with all its revisions. */
@Entity({ name: 'stage' })
@Unique('stage_reference', ['projectId', 'reference'])
export class StageEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @ManyToOne(() => ProjectEntity, { nullable: false })
  @JoinColumn({ name: 'project_id', foreignKeyConstraintName: 'stage_of_project' })
  project?: ProjectEntity;

  @Column({ type: 'text', name: 'project_id' }) projectId!: string;

  @Column({ type: 'text' }) reference!: string;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;
}
