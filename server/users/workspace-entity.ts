import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The firm that runs this installation: one row, made at set-up. */
@Entity({ name: 'workspace' })
export class WorkspaceEntity {
  @PrimaryColumn({ type: 'integer' }) id!: 1;

  @Column({ type: 'text' }) name!: string;
}
