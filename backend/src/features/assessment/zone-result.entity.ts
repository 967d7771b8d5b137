import type { ZoneTargetDto } from '@mantlet/common';
import { Column, Entity, JoinColumn, OneToOne, PrimaryColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { measure, timestamp } from '../../database/columns.js';
import { Zone } from '../zones/zone.entity.js';

/** The target protection level of a zone, per system, as last worked out. */
@Entity('zone_results')
export class ZoneResult {
  @PrimaryColumn('uuid') zoneId!: string;
  /** over the members' own hashes: a member that left or came is seen */
  @Column('text') inputsHash!: string;
  @Column(timestamp) assessedAt!: Date;
  @Column('integer') members!: number;
  @Column('integer') settled!: number;
  @Column('integer') open!: number;
  @Column(measure) protectedAreaM2!: number;
  @Column('jsonb') targets!: ZoneTargetDto[];
  @OneToOne(() => Zone, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'zone_id' }) zone!: Relation<Zone>;
}
