import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import { RevisionEntity } from '../revisions/revision-entity.ts';

/** A numbered finding of the check, tied to a criterion or a field. */
@Entity({ name: 'finding' })
@Unique('finding_number', ['revisionId', 'number'])
export class FindingEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @ManyToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'finding_of_revision' })
  revision?: RevisionEntity;

  @Column({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @Column({ type: 'integer' }) number!: number;

  @Column({ type: 'text', name: 'subject_kind' }) subjectKind!: 'criterion' | 'field';

  @Column({ type: 'text', name: 'subject_id' }) subjectId!: string;

  @Column({ type: 'text' }) title!: string;

  /** What its last event made it. */
  @Column({ type: 'text' }) state!: 'open' | 'answered' | 'closed';
}
