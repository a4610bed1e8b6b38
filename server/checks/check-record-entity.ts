import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { RevisionEntity } from '../revisions/revision-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';

/** The independent check of one submission; `round` counts submissions of the revision from 1. */
@Entity({ name: 'check_record' })
export class CheckRecordEntity {
  @ManyToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'check_record_of_revision' })
  revision?: RevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @PrimaryColumn({ type: 'integer' }) round!: number;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'checker_id', foreignKeyConstraintName: 'check_record_checker' })
  checker?: PersonEntity;

  /** Who saved it last. */
  @Column({ type: 'text', name: 'checker_id' }) checkerId!: string;

  @Column({ type: 'integer', name: 'saved_at_ms' }) savedAtMs!: number;

  @Column({ type: 'real', name: 'overdrive_factor', nullable: true })
  overdriveFactor!: number | null;

  @Column({ type: 'text', nullable: true }) method!: 'hand' | 'bench' | null;

  @Column({ type: 'text' }) note!: string;

  @Column({ type: 'text' }) reason!: string;

  @Column({ type: 'simple-json' }) justifications!: Record<string, string>;

  @Column({ type: 'simple-json' }) read!: string[];
}
