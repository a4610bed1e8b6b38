import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, Unique } from 'typeorm';
import type { PartRecord } from '../../shared/parts/part-record.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { PartEntity } from './part-entity.ts';

/** A part's data as they stood at one edit. The table refuses every change. */
@Entity({ name: 'part_revision' })
@Unique('part_revision_number', ['partId', 'number'])
export class PartRevisionEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @ManyToOne(() => PartEntity, { nullable: false })
  @JoinColumn({ name: 'part_id', foreignKeyConstraintName: 'part_revision_of_part' })
  part?: PartEntity;

  @Column({ type: 'text', name: 'part_id' }) partId!: string;

  /** 1 for the first. */
  @Column({ type: 'integer' }) number!: number;

  @Column({ type: 'simple-json' }) record!: PartRecord;

  /** One line for lists. */
  @Column({ type: 'text' }) summary!: string;

  /** Number, aliases and description in lower case. */
  @Column({ type: 'text' }) search!: string;

  /** What was changed, and why. */
  @Column({ type: 'text' }) comment!: string;

  @ManyToOne(() => PersonEntity, { nullable: true })
  @JoinColumn({ name: 'author_id', foreignKeyConstraintName: 'part_revision_author' })
  author?: PersonEntity | null;

  /** Null for the library shipped with the product. */
  @Column({ type: 'text', name: 'author_id', nullable: true }) authorId!: string | null;

  @Column({ type: 'integer', name: 'created_at_ms' }) createdAtMs!: number;
}
