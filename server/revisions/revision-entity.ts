import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import type { Evaluation } from '../../shared/checks/evaluation.ts';
import type { Designators } from '../../shared/contract/revision.ts';
import type { StoredState } from '../../shared/review/revision-state.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { StageEntity } from '../stages/stage-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';
import type { PartSnapshot } from './part-snapshot.ts';
import { RevisionFigures } from './revision-figures.ts';

/** One revision of a stage. Columns are what we query by; documents are read whole. */
@Entity({ name: 'revision' })
@Unique('revision_number', ['stageId', 'number'])
@Index('revision_by_state', ['state'])
export class RevisionEntity extends RevisionFigures {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @ManyToOne(() => StageEntity, { nullable: false })
  @JoinColumn({ name: 'stage_id', foreignKeyConstraintName: 'revision_of_stage' })
  stage?: StageEntity;

  @Column({ type: 'text', name: 'stage_id' }) stageId!: string;

  /** 0 for the first; the letter follows from it. */
  @Column({ type: 'integer' }) number!: number;

  @Column({ type: 'text' }) state!: StoredState;

  @Column({ type: 'simple-json' }) definition!: StageInput;

  /** Written with the definition, by the engine version it names. */
  @Column({ type: 'simple-json' }) evaluation!: Evaluation;

  @Column({ type: 'simple-json' }) designators!: Designators;

  /** Library data behind the links as they stood at submission; null in a draft. */
  @Column({ type: 'simple-json', name: 'part_snapshot', nullable: true })
  partSnapshot!: PartSnapshot[] | null;

  @ManyToOne(() => PolicyEntity, { nullable: false })
  @JoinColumn({ name: 'policy_id', foreignKeyConstraintName: 'revision_policy' })
  policy?: PolicyEntity;

  @Column({ type: 'text', name: 'policy_id' }) policyId!: string;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'designer_id', foreignKeyConstraintName: 'revision_designer' })
  designer?: PersonEntity;

  /** Who started the revision. */
  @Column({ type: 'text', name: 'designer_id' }) designerId!: string;

  @ManyToOne(() => RevisionEntity, { nullable: true })
  @JoinColumn({ name: 'previous_id', foreignKeyConstraintName: 'revision_previous' })
  previous?: RevisionEntity | null;

  @Column({ type: 'text', name: 'previous_id', nullable: true }) previousId!: string | null;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;

  @Column({ type: 'integer', name: 'saved_at_ms' }) savedAtMs!: number;

  /** Grows with everything written to the revision, its check and its findings. */
  @Column({ type: 'integer' }) version!: number;
}
