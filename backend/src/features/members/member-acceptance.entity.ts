import type { Acceptance } from '@mantlet/common';
import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { nullableMeasure, timestamp } from '../../database/columns.js';
import { User } from '../users/user.entity.js';
import { Member } from './member.entity.js';

/** A fire engineer's signature under an assumed or high temperature, or under leaving a member bare. */
@Entity('member_acceptances')
export class MemberAcceptance {
  @PrimaryColumn('uuid') memberId!: string;
  @PrimaryColumn('text') kind!: Acceptance['kind'];
  /** the temperature that was accepted; another value needs another signature */
  @Column(nullableMeasure) valueC!: number | null;
  @Column('text') reason!: string;
  @Column('uuid') acceptedById!: string;
  @Column(timestamp) acceptedAt!: Date;
  @ManyToOne(() => Member, (member) => member.acceptances, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'member_id' }) member!: Relation<Member>;
  @ManyToOne(() => User, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'accepted_by_id' }) acceptedBy!: Relation<User>;
}
