import type { ProjectSettings } from '@mantlet/common';
import { Column, CreateDateColumn, Entity, PrimaryGeneratedColumn, VersionColumn } from 'typeorm';

@Entity('projects')
export class Project {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('text', { unique: true }) number!: string;
  @Column('text') name!: string;
  @Column('text', { default: '' }) place!: string;
  @Column('text', { default: 'EUR' }) currency!: string;
  @Column('text', { default: '' }) note!: string;
  @Column('jsonb') settings!: ProjectSettings;
  @VersionColumn() version!: number;
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
}
