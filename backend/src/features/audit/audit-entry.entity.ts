import type { AuditEntryDto } from '@mantlet/common';
import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import { timestamp } from '../../database/columns.js';

/** Who changed what, when, from what to what, and why. Append-only: the database refuses update and delete. */
@Entity('audit_entries')
@Index('audit_entries_by_entity', ['entity', 'entityId'])
@Index('audit_entries_by_project', ['projectId', 'at'])
export class AuditEntry {
  @PrimaryGeneratedColumn('identity', { type: 'bigint' }) id!: string;
  @Column({ ...timestamp, default: () => 'now()' }) at!: Date;
  /** no foreign keys: the trail outlives what it tells of */
  @Column('uuid', { nullable: true }) projectId!: string | null;
  @Column('uuid', { nullable: true }) userId!: string | null;
  @Column('text') userName!: string;
  @Column('text') action!: string;
  @Column('text') entity!: string;
  @Column('uuid', { nullable: true }) entityId!: string | null;
  @Column('text') label!: string;
  @Column('jsonb', { default: [] }) changes!: AuditEntryDto['changes'];
  @Column('text', { nullable: true }) why!: string | null;
}
