import { Column, Entity, PrimaryColumn, Unique, VersionColumn } from 'typeorm';
import { asBoolean } from '../persistence/boolean-column.ts';

/** An account. People are disabled, never deleted: the trail and signatures name them. */
@Entity({ name: 'person' })
@Unique('person_email', ['email'])
export class PersonEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @Column({ type: 'text' }) name!: string;

  /** Lower case. */
  @Column({ type: 'text' }) email!: string;

  @Column({ type: 'integer', transformer: asBoolean }) administrator!: boolean;

  @Column({ type: 'text' }) state!: 'invited' | 'active' | 'disabled';

  /** Null until an invitation is taken up. */
  @Column({ type: 'text', name: 'password_hash', nullable: true }) passwordHash!: string | null;

  /** Grows with every new password: older one-time links die. */
  @Column({ type: 'integer', name: 'password_version' }) passwordVersion!: number;

  /** Wrong passwords in a row, over all addresses. */
  @Column({ type: 'integer', name: 'failed_sign_ins' }) failedSignIns!: number;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;

  @Column({ type: 'integer', name: 'last_sign_in_at_ms', nullable: true })
  lastSignInAtMs!: number | null;

  @VersionColumn({ type: 'integer' }) version!: number;
}
