import type { LinkPurpose } from '@mantlet/common';
import { Check, Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, Unique } from 'typeorm';
import type { Relation } from 'typeorm';
import { nullableTimestamp, timestamp } from '../../database/columns.js';
import { User } from './user.entity.js';

/** A link that was mailed. Its token is kept as a digest only: whoever reads the database cannot follow it. */
@Entity('account_links')
@Unique('account_links_token', ['tokenHash'])
@Check('account_links_purpose', `purpose IN ('invitation', 'password-reset')`)
@Index('account_links_by_user', ['userId'])
export class AccountLinkRecord {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'account_links_id' }) id!: string;
  @Column('uuid') userId!: string;
  @Column('text') purpose!: LinkPurpose;
  /** SHA-256, hexadecimal */
  @Column('text') tokenHash!: string;
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
  @Column(timestamp) expiresAt!: Date;
  @Column(nullableTimestamp) usedAt!: Date | null;
  @ManyToOne(() => User, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'account_links_user' }) user!: Relation<User>;
}
