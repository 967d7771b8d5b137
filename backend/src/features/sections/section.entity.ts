import type { SectionFamily, SectionProperties, SectionShape } from '@mantlet/common';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { natural } from '../../database/columns.js';
import { Project } from '../projects/project.entity.js';

/** A catalogue section (no project) or one a project made for itself. Properties are computed from the shape and kept beside it. */
@Entity('sections')
@Index('sections_catalogue_designation', ['designationKey'], { unique: true, where: 'project_id IS NULL' })
@Index('sections_project_designation', ['projectId', 'designationKey'], { unique: true, where: 'project_id IS NOT NULL' })
export class Section {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid', { nullable: true }) projectId!: string | null;
  @Index() @Column('text') family!: SectionFamily;
  @Column(natural) designation!: string;
  /** normalised spelling, by which schedules find it */
  @Column('text') designationKey!: string;
  @Column('text', { array: true, default: [] }) otherNames!: string[];
  @Column('text', { default: '' }) standard!: string;
  @Column('jsonb') shape!: SectionShape;
  @Column('jsonb') properties!: SectionProperties;
  @ManyToOne(() => Project, { onDelete: 'CASCADE', nullable: true }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project> | null;
}
