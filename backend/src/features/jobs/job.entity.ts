import type { JobKind, JobState, Message } from '@mantlet/common';
import { Check, Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { nullableTimestamp, timestamp } from '../../database/columns.js';
import { Project } from '../projects/project.entity.js';

/** Work of a project that goes on in the background, as people see it; the queue itself is graphile-worker's. */
@Entity('jobs')
@Check('jobs_state', `state IN ('waiting', 'running', 'failed', 'done')`)
@Index('jobs_one_unfinished', ['projectId', 'kind'], { unique: true, where: `state <> 'done'` })
@Index('jobs_by_project', ['projectId', 'createdAt'])
export class Job {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Column('text') kind!: JobKind;
  @Column('text', { default: 'waiting' }) state!: JobState;
  @Column('integer', { default: 0 }) total!: number;
  @Column('integer', { default: 0 }) done!: number;
  /** why it failed */
  @Column('jsonb', { nullable: true }) reason!: Message | null;
  @CreateDateColumn(timestamp) createdAt!: Date;
  @Column(nullableTimestamp) startedAt!: Date | null;
  @Column(nullableTimestamp) finishedAt!: Date | null;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
}
