import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Move } from '../../shared/review/revision-state.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { RevisionEntity } from './revision-entity.ts';

/** The way of a revision through the review, move by move. The table is append-only. */
@Entity({ name: 'revision_move' })
export class RevisionMoveEntity {
  @ManyToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'revision_move_of_revision' })
  revision?: RevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @PrimaryColumn({ type: 'integer' }) sequence!: number;

  @Column({ type: 'text' }) move!: Move;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'revision_move_person' })
  person?: PersonEntity;

  @Column({ type: 'text', name: 'person_id' }) personId!: string;

  @Column({ type: 'integer', name: 'at_ms' }) atMs!: number;

  @Column({ type: 'text', nullable: true }) reason!: string | null;
}
