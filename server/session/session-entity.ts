import type { SessionData } from 'express-session';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';

/** A browser's session. Whoever reads this table cannot use it: the cookie's id is stored as a hash. */
@Entity({ name: 'session' })
@Unique('session_public_id', ['publicId'])
@Index('session_by_person', ['personId'])
@Index('session_by_last_seen', ['lastSeenAtMs'])
export class SessionEntity {
  /** SHA-256 of the session id, hex. */
  @PrimaryColumn({ type: 'text', name: 'id_hash' }) idHash!: string;

  /** Names the session on screens. */
  @Column({ type: 'text', name: 'public_id' }) publicId!: string;

  @ManyToOne(() => PersonEntity, { nullable: true })
  @JoinColumn({ name: 'person_id', foreignKeyConstraintName: 'session_of_person' })
  person?: PersonEntity | null;

  /** Null before sign-in. */
  @Column({ type: 'text', name: 'person_id', nullable: true }) personId!: string | null;

  @Column({ type: 'simple-json' }) data!: SessionData;

  @Column({ type: 'text' }) agent!: string;

  @Column({ type: 'integer', name: 'started_at_ms' }) startedAtMs!: number;

  @Column({ type: 'integer', name: 'last_seen_at_ms' }) lastSeenAtMs!: number;
}
