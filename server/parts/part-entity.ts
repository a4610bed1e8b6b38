import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import type { PartKind } from '../../shared/parts/part-record.ts';

/** A part of the library; its data stand in its revisions. The table refuses every change. */
@Entity({ name: 'part' })
@Unique('part_number_of_kind', ['kind', 'partNumber'])
export class PartEntity {
  @PrimaryColumn({ type: 'text' }) id!: string;

  @Column({ type: 'text' }) kind!: PartKind;

  @Column({ type: 'text', name: 'part_number' }) partNumber!: string;
}
