import type { FireCurve, TargetPolicy } from '@mantlet/common';
import { Check, Column, Entity, Index, JoinColumn, ManyToOne, OneToMany, PrimaryGeneratedColumn, Unique, VersionColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { natural } from '../../database/columns.js';
import { Level } from '../levels/level.entity.js';
import { Project } from '../projects/project.entity.js';
import { ZoneSystem } from './zone-system.entity.js';

@Entity('zones')
@Unique('zones_code', ['projectId', 'code'])
@Check('zones_period', 'period_min > 0')
export class Zone {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Index() @Column('uuid') levelId!: string;
  @Column(natural) code!: string;
  @Column('text') name!: string;
  @Column('integer') periodMin!: number;
  @Column('jsonb') curve!: FireCurve;
  @Column('text', { default: '' }) reference!: string;
  @Column('text', { default: 'C1' }) environment!: string;
  @Column('jsonb', { default: { policy: 'own' } }) targetPolicy!: TargetPolicy;
  @VersionColumn() version!: number;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => Level, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'level_id' }) level!: Relation<Level>;
  @OneToMany(() => ZoneSystem, (system) => system.zone) systems!: Relation<ZoneSystem[]>;
}
