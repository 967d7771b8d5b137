import type { CriticalTemperatureBasis, Exposure, MemberType, ProtectionForm, SteelGrade } from '@mantlet/common';
import { Check, Column, Entity, Index, JoinColumn, ManyToOne, OneToMany, OneToOne, PrimaryGeneratedColumn, Unique, VersionColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { measure, natural, nullableTimestamp } from '../../database/columns.js';
import { MemberResult } from '../assessment/member-result.entity.js';
import { Project } from '../projects/project.entity.js';
import { Section } from '../sections/section.entity.js';
import { User } from '../users/user.entity.js';
import { Zone } from '../zones/zone.entity.js';
import { MemberAcceptance } from './member-acceptance.entity.js';

@Entity('members')
@Unique('members_mark', ['projectId', 'mark'])
@Check('members_length', 'length_mm > 0')
@Check('members_quantity', 'quantity > 0')
export class Member {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('uuid') projectId!: string;
  @Index() @Column('uuid') zoneId!: string;
  @Column(natural) mark!: string;
  @Column('text') memberType!: MemberType;
  @Index() @Column('uuid') sectionId!: string;
  @Column('text') grade!: SteelGrade;
  @Column(measure) lengthMm!: number;
  @Column('integer') quantity!: number;
  @Column('jsonb') exposure!: Exposure;
  @Column('text') protectionForm!: ProtectionForm;
  @Column('integer', { default: 0 }) coatBackConnections!: number;
  @Column({ ...measure, default: 0 }) coatBackGirthMm!: number;
  @Column({ ...measure, default: 0 }) deductionM2!: number;
  @Column('boolean', { default: true }) onSite!: boolean;
  @Column('text', { default: '' }) note!: string;
  /** how the critical temperature enters; the structural engineer's alone */
  @Column('jsonb', { default: { way: 'none' } }) basis!: CriticalTemperatureBasis;
  @Column('uuid', { nullable: true }) basisSetById!: string | null;
  @Column(nullableTimestamp) basisSetAt!: Date | null;
  @VersionColumn() version!: number;
  @ManyToOne(() => Project, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'project_id' }) project!: Relation<Project>;
  @ManyToOne(() => Zone, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'zone_id' }) zone!: Relation<Zone>;
  @ManyToOne(() => Section, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'section_id' }) section!: Relation<Section>;
  @ManyToOne(() => User, { onDelete: 'RESTRICT', nullable: true }) @JoinColumn({ name: 'basis_set_by_id' }) basisSetBy!: Relation<User> | null;
  @OneToMany(() => MemberAcceptance, (acceptance) => acceptance.member) acceptances!: Relation<MemberAcceptance[]>;
  @OneToOne(() => MemberResult, (result) => result.member) result!: Relation<MemberResult> | null;
}
