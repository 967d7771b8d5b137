import type { MailFailure, MailTemplate } from '@mantlet/common';
import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { nullableTimestamp } from '../../database/columns.js';
import { User } from '../users/user.entity.js';

/** That a mail was to be sent, and what became of it. Its text, which may hold a link that opens an account, is kept nowhere. */
@Entity('mails')
@Index('mails_by_user', ['userId', 'createdAt'])
export class Mail {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'mails_id' }) id!: string;
  @Column('uuid', { nullable: true }) userId!: string | null;
  @Column('text') toAddress!: string;
  @Column('text') template!: MailTemplate;
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
  @Column('integer', { default: 0 }) attempts!: number;
  @Column(nullableTimestamp) sentAt!: Date | null;
  @Column('text', { nullable: true }) failure!: MailFailure | null;
  @ManyToOne(() => User, { onDelete: 'CASCADE', nullable: true }) @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'mails_user' }) user!: Relation<User> | null;
}
