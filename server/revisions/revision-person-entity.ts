import { Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';
import { RevisionEntity } from './revision-entity.ts';

/**
 * Who ever had a hand in a revision: authors changed or submitted it, checkers recorded or decided a check.
 * Separation of duties rests on these rows, so no later change of roles can get round it.
 */
@Entity({ name: 'revision_person' })
export class RevisionPersonEntity {
  @ManyToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'revision_person_of_revision' })
  revision?: RevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'revision_person_person' })
  person?: PersonEntity;

  @PrimaryColumn({ type: 'text', name: 'person_id' }) personId!: string;

  @PrimaryColumn({ type: 'text' }) hand!: 'author' | 'checker';
}
