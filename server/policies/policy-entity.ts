import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import type { PolicyLimits } from '../../shared/stage/policy.ts';

/** A released version of a set of limits. The table refuses every change. */
@Entity({ name: 'policy' })
@Unique('policy_version', ['name', 'version'])
export class PolicyEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @Column({ type: 'text' }) name!: string;

  @Column({ type: 'integer' }) version!: number;

  @Column({ type: 'simple-json' }) limits!: PolicyLimits;
}
