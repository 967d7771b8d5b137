import type { Role } from '@mantlet/common';
import { Check, Column, Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { Project } from '../projects/project.entity.js';
import { User } from '../users/user.entity.js';

/** A person's roles on a project. */
@Entity('memberships')
@Check('memberships_has_a_role', 'cardinality(roles) > 0')
export class Membership {
  @PrimaryColumn('uuid') projectId!: string;
  @PrimaryColumn('uuid') userId!: string;
  @Column('text', { array: true }) roles!: Role[];
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => User, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'user_id' }) user!: Relation<User>;
}
