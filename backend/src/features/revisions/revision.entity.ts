import type { RevisionState } from '@mantlet/common';
import { Check, Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, Unique } from 'typeorm';
import type { Relation } from 'typeorm';
import { natural, nullableMeasure, nullableTimestamp } from '../../database/columns.js';
import { Project } from '../projects/project.entity.js';
import { User } from '../users/user.entity.js';

/** One revision of the protection schedule. Once issued, the database itself refuses any change to it. */
@Entity('revisions')
@Unique('revisions_code', ['projectId', 'code'])
@Index('revisions_one_open', ['projectId'], { unique: true, where: "state IN ('draft', 'prepared', 'checked')" })
@Index('revisions_one_issued', ['projectId'], { unique: true, where: "state = 'issued'" })
@Check('revisions_state', "state IN ('draft', 'prepared', 'checked', 'issued', 'superseded')")
@Check('revisions_second_pair_of_eyes', 'checked_by_id IS NULL OR checked_by_id <> prepared_by_id')
@Check('revisions_issued_whole', "state NOT IN ('issued', 'superseded') OR (snapshot_sha256 IS NOT NULL AND pdf_sha256 IS NOT NULL AND issued_at IS NOT NULL)")
export class Revision {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Column(natural) code!: string;
  @Column('text', { default: '' }) purpose!: string;
  @Column('text', { default: 'draft' }) state!: RevisionState;
  @Column('uuid', { nullable: true }) preparedById!: string | null;
  @Column(nullableTimestamp) preparedAt!: Date | null;
  @Column('uuid', { nullable: true }) checkedById!: string | null;
  @Column(nullableTimestamp) checkedAt!: Date | null;
  @Column('uuid', { nullable: true }) issuedById!: string | null;
  @Column(nullableTimestamp) issuedAt!: Date | null;
  @Column('text', { nullable: true }) returnedComment!: string | null;
  /** canonical JSON text, kept as text so that its digest can be checked byte for byte */
  @Column('text', { nullable: true, select: false }) snapshot!: string | null;
  @Column('text', { nullable: true }) snapshotSha256!: string | null;
  @Column('bytea', { nullable: true, select: false }) pdf!: Buffer | null;
  @Column('text', { nullable: true }) pdfSha256!: string | null;
  @Column('integer', { nullable: true }) pdfBytes!: number | null;
  @Column('integer', { nullable: true }) members!: number | null;
  @Column(nullableMeasure) protectedAreaM2!: number | null;
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
  @ManyToOne(() => Project, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => User, { onDelete: 'RESTRICT', nullable: true }) @JoinColumn({ name: 'prepared_by_id' }) preparedBy!: Relation<User> | null;
  @ManyToOne(() => User, { onDelete: 'RESTRICT', nullable: true }) @JoinColumn({ name: 'checked_by_id' }) checkedBy!: Relation<User> | null;
  @ManyToOne(() => User, { onDelete: 'RESTRICT', nullable: true }) @JoinColumn({ name: 'issued_by_id' }) issuedBy!: Relation<User> | null;
}
