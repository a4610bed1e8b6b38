import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import type { BomNote } from '../../shared/report/bom-note.ts';
import { ProjectEntity } from '../projects/project-entity.ts';
import { PersonEntity } from '../users/person-entity.ts';

/** An issued note: the snapshot all its files are made from. The table refuses every change. */
@Entity({ name: 'bom_note' })
@Unique('bom_note_number', ['projectId', 'number'])
export class BomNoteEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @ManyToOne(() => ProjectEntity, { nullable: false })
  @JoinColumn({ name: 'project_id', foreignKeyConstraintName: 'bom_note_of_project' })
  project?: ProjectEntity;

  @Column({ type: 'text', name: 'project_id' }) projectId!: string;

  /** From 1 in every project, without gaps. */
  @Column({ type: 'integer' }) number!: number;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'issuer_id', foreignKeyConstraintName: 'bom_note_issuer' })
  issuer?: PersonEntity;

  @Column({ type: 'text', name: 'issuer_id' }) issuerId!: string;

  @Column({ type: 'integer', name: 'issued_at_ms' }) issuedAtMs!: number;

  /** With its content hash. */
  @Column({ type: 'simple-json' }) note!: BomNote;
}
