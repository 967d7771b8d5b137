import type { ImportDto, ImportMapping } from '@mantlet/common';
import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { Project } from '../projects/project.entity.js';
import { User } from '../users/user.entity.js';

/** An uploaded member schedule on its way in. Nothing reaches the members until it is confirmed. */
@Entity('member_imports')
export class MemberImport {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Index() @Column('uuid') projectId!: string;
  @Column('uuid') userId!: string;
  @Column('text') fileName!: string;
  @Column('text', { default: 'mapping' }) state!: ImportDto['state'];
  /** every cell as text, per sheet; dropped when confirmed or abandoned */
  @Column('jsonb', { nullable: true, select: false }) cells!: { name: string; rows: string[][] }[] | null;
  @Column('jsonb') mapping!: ImportMapping;
  /** what the last preview showed; confirming writes that or nothing */
  @Column('text', { nullable: true }) previewDigest!: string | null;
  @Column('jsonb', { default: [] }) notes!: string[];
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => User, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'user_id' }) user!: Relation<User>;
}
