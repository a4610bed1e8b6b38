import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Sequence and hash of the last line, apart from the lines: a line cut off at the end is missed here. */
@Entity({ name: 'audit_head' })
export class AuditHeadEntity {
  @PrimaryColumn({ type: 'integer' }) id!: 1;

  @Column({ type: 'integer' }) sequence!: number;

  @Column({ type: 'text' }) hash!: string;
}
