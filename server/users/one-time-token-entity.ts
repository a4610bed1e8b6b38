import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { PersonEntity } from './person-entity.ts';

/** A mailed link that works once. Only the hash of its token is kept. */
@Entity({ name: 'one_time_token' })
@Index('one_time_token_by_person', ['personId'])
export class OneTimeTokenEntity {
  /** SHA-256 of the token, hex. */
  @PrimaryColumn({ type: 'text' }) hash!: string;

  @Column({ type: 'text' }) kind!: 'password-reset' | 'invitation' | 'email-change';

  @ManyToOne(() => PersonEntity, { nullable: false })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'one_time_token_of_person' })
  person?: PersonEntity;

  @Column({ type: 'text', name: 'person_id' }) personId!: string;

  /** The person's at issue: a password set since voids the link. */
  @Column({ type: 'integer', name: 'password_version' }) passwordVersion!: number;

  @Column({ type: 'integer', name: 'expires_at_ms' }) expiresAtMs!: number;

  @Column({ type: 'simple-json' }) detail!: Record<string, string>;
}
