import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A mail written with the change that causes it, sent after the commit. */
@Entity({ name: 'outgoing_mail' })
@Index('outgoing_mail_by_next_attempt', ['nextAttemptAtMs'])
export class OutgoingMailEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @Column({ type: 'text', name: 'to_name' }) toName!: string;

  @Column({ type: 'text', name: 'to_address' }) toAddress!: string;

  @Column({ type: 'text' }) subject!: string;

  /** Emptied once sent: links in it are secrets. */
  @Column({ type: 'text' }) text!: string;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;

  @Column({ type: 'integer' }) attempts!: number;

  /** Null once sent or given up. */
  @Column({ type: 'integer', name: 'next_attempt_at_ms', nullable: true })
  nextAttemptAtMs!: number | null;

  @Column({ type: 'integer', name: 'sent_at_ms', nullable: true }) sentAtMs!: number | null;
}
