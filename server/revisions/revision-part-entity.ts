import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { PartStanding } from '../../shared/contract/revision.ts';
import { PartRevisionEntity } from '../parts/part-revision-entity.ts';
import { RevisionEntity } from './revision-entity.ts';

/** Which part revision the figures of one role were filled from. */
@Entity({ name: 'revision_part' })
@Index('revision_part_by_part', ['partRevisionId'])
export class RevisionPartEntity {
  @ManyToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'revision_part_of_revision' })
  revision?: RevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @PrimaryColumn({ type: 'text' }) role!: PartStanding['role'];

  @ManyToOne(() => PartRevisionEntity, { nullable: false })
  @JoinColumn({ name: 'part_revision_id', foreignKeyConstraintName: 'revision_part_part' })
  partRevision?: PartRevisionEntity;

  @Column({ type: 'text', name: 'part_revision_id' }) partRevisionId!: string;

  /** Gain group, maker and the like. */
  @Column({ type: 'simple-json' }) choice!: Record<string, string>;
}
