import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One line of the trail. The table refuses UPDATE and DELETE. */
@Entity({ name: 'audit_line' })
@Index('audit_line_of_project', ['projectId', 'sequence'])
@Index('audit_line_of_object', ['objectId', 'sequence'])
export class AuditLineEntity {
  @PrimaryColumn({ type: 'integer' }) sequence!: number;

  @Column({ type: 'integer', name: 'at_ms' }) atMs!: number;

  @Column({ type: 'text', name: 'who_id', nullable: true }) whoId!: string | null;

  /** Real name at that time. */
  @Column({ type: 'text', nullable: true }) who!: string | null;

  @Column({ type: 'text' }) action!: string;

  @Column({ type: 'text', name: 'object_kind' }) objectKind!: string;

  @Column({ type: 'text', name: 'object_id' }) objectId!: string;

  @Column({ type: 'text', name: 'object_name' }) objectName!: string;

  @Column({ type: 'text', name: 'project_id', nullable: true }) projectId!: string | null;

  @Column({ type: 'text' }) summary!: string;

  @Column({ type: 'simple-json' }) detail!: Record<string, unknown>;

  @Column({ type: 'text', name: 'request_id' }) requestId!: string;

  @Column({ type: 'text' }) hash!: string;
}
