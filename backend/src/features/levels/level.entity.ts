import { Check, Column, Entity, JoinColumn, ManyToOne, PrimaryGeneratedColumn, Unique, VersionColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { measure, natural } from '../../database/columns.js';
import { Project } from '../projects/project.entity.js';

@Entity('levels')
@Unique('levels_code', ['projectId', 'code'])
@Check('levels_height', 'height_m > 0')
export class Level {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Column(natural) code!: string;
  @Column('text') name!: string;
  @Column(measure) elevationM!: number;
  @Column(measure) heightM!: number;
  @VersionColumn() version!: number;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
}
