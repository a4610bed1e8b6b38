import { Column, Entity, JoinColumn, ManyToOne, OneToOne, PrimaryColumn } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';
import { RevisionEntity } from './revision-entity.ts';

/** The approver's signature under a locked revision. The table refuses every change. */
@Entity({ name: 'signature' })
export class SignatureEntity {
  @OneToOne(() => RevisionEntity, { nullable: false })
  @JoinColumn({ name: 'revision_id', foreignKeyConstraintName: 'signature_of_revision' })
  revision?: RevisionEntity;

  @PrimaryColumn({ type: 'text', name: 'revision_id' }) revisionId!: string;

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'approver_id', foreignKeyConstraintName: 'signature_approver' })
  approver?: PersonEntity;

  @Column({ type: 'text', name: 'approver_id' }) approverId!: string;

  /** The printed name at the time of signing. */
  @Column({ type: 'text', name: 'approver_name' }) approverName!: string;

  @Column({ type: 'integer', name: 'signed_at_ms' }) signedAtMs!: number;

  @Column({ type: 'text' }) meaning!: string;

  /** SHA-256 over `document`, hex. */
  @Column({ type: 'text' }) hash!: string;

  /** What was signed, as canonical JSON. */
  @Column({ type: 'text' }) document!: string;
}
