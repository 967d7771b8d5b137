import { Column, Entity, JoinColumn, ManyToOne, PrimaryGeneratedColumn, Unique } from 'typeorm';
import type { Relation } from 'typeorm';
import { natural } from '../../database/columns.js';
import { Project } from '../projects/project.entity.js';
import { User } from '../users/user.entity.js';

/** A list of members that a person keeps for themselves: filter, order and columns, as the address has them. */
@Entity('member_views')
@Unique('member_views_name', ['projectId', 'userId', 'name'])
export class MemberView {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Column('uuid') userId!: string;
  @Column(natural) name!: string;
  @Column('text') query!: string;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => User, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'user_id' }) user!: Relation<User>;
}
