import type { Evidence, NominalCurve, ProductKind, ProductSupply } from '@mantlet/common';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, VersionColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { Project } from '../projects/project.entity.js';

/** A protection product with its assessed data; shared library where there is no project. */
@Entity('products')
@Index('products_shared_name', ['name', 'evidenceEdition'], { unique: true, where: 'project_id IS NULL' })
@Index('products_project_name', ['projectId', 'name', 'evidenceEdition'], { unique: true, where: 'project_id IS NOT NULL' })
export class Product {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid', { nullable: true }) projectId!: string | null;
  @Column('text') name!: string;
  @Column('text') maker!: string;
  @Column('text') kind!: ProductKind;
  @Column('boolean', { default: false }) invented!: boolean;
  @Column('text') evidenceReference!: string;
  @Column('text') evidenceEdition!: string;
  @Column('date') evidenceExpiresOn!: string;
  @Column('text') evidenceStandard!: string;
  @Column('text', { array: true }) curves!: NominalCurve[];
  @Column('text', { array: true, default: [] }) environments!: ('C1' | 'C2' | 'C3' | 'C4' | 'C5' | 'CX')[];
  @Column('jsonb') evidence!: Evidence;
  @Column('jsonb') supply!: ProductSupply;
  @Column('text', { default: '' }) note!: string;
  @Column('text', { nullable: true }) evidenceFileName!: string | null;
  @Column('text', { nullable: true }) evidenceFileSha256!: string | null;
  @Column('integer', { nullable: true }) evidenceFileBytes!: number | null;
  @Column('bytea', { nullable: true, select: false }) evidenceFile!: Buffer | null;
  @VersionColumn() version!: number;
  @ManyToOne(() => Project, { onDelete: 'CASCADE', nullable: true }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project> | null;
}
