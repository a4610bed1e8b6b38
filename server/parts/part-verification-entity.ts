import { Column, Entity, JoinColumn, OneToOne, ManyToOne, PrimaryColumn } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';
import { PartRevisionEntity } from './part-revision-entity.ts';

/** Somebody read a part revision back against the document named. The table refuses every change. */
@Entity({ name: 'part_verification' })
export class PartVerificationEntity {
  @OneToOne(() => PartRevisionEntity, { nullable: false })
  @JoinColumn({
    name: 'part_revision_id',
    foreignKeyConstraintName: 'part_verification_of_revision',
  })
  partRevision?: PartRevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'part_revision_id' }) partRevisionId!: string;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'part_verification_person' })
  person?: PersonEntity;

  @Column({ type: 'text', name: 'person_id' }) personId!: string;

  @Column({ type: 'text' }) document!: string;

  @Column({ type: 'text' }) note!: string;

  @Column({ type: 'integer', name: 'at_ms' }) atMs!: number;
}
