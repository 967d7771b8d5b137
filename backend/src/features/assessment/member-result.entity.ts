import type { CriticalTemperatureWay, Message, VerdictKind } from '@mantlet/common';
import { Column, Entity, Index, JoinColumn, ManyToOne, OneToOne, PrimaryColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { nullableMeasure, timestamp } from '../../database/columns.js';
import { Member } from '../members/member.entity.js';
import { Product } from '../products/product.entity.js';

/** What a member needs, as last assessed; inputsHash says from which inputs. */
@Entity('member_results')
export class MemberResult {
  @PrimaryColumn('uuid') memberId!: string;
  @Column('text') inputsHash!: string;
  @Column(timestamp) assessedAt!: Date;
  @Index() @Column('text') verdict!: VerdictKind;
  @Column('jsonb', { nullable: true }) reason!: Message | null;
  @Column(nullableMeasure) heatedPerimeterMm!: number | null;
  @Column(nullableMeasure) sectionFactorPerM!: number | null;
  @Column(nullableMeasure) coatedGirthMm!: number | null;
  @Column(nullableMeasure) criticalTemperatureC!: number | null;
  @Column(nullableMeasure) bareCriticalTemperatureC!: number | null;
  @Column('text') way!: CriticalTemperatureWay;
  @Column('text', { nullable: true }) method!: string | null;
  @Column('text', { nullable: true }) governing!: string | null;
  @Column(nullableMeasure) utilisation!: number | null;
  @Column('boolean', { default: false }) assumed!: boolean;
  @Column(nullableMeasure) bareMinutes!: number | null;
  @Column(nullableMeasure) bareTemperatureC!: number | null;
  @Column(nullableMeasure) requiredThickness!: number | null;
  @Column(nullableMeasure) appliedThickness!: number | null;
  @Column('text', { nullable: true }) thicknessUnit!: 'µm' | 'mm' | null;
  @Column('double precision', { array: true, nullable: true }) layers!: number[] | null;
  @Index() @Column('uuid', { nullable: true }) productId!: string | null;
  @Column('text', { nullable: true }) evidenceReading!: string | null;
  /** protected area of all its pieces, net, m²; null where nothing is protected */
  @Column(nullableMeasure) areaM2!: number | null;
  /** keeps the schedule from being prepared */
  @Index() @Column('boolean', { default: false }) open!: boolean;
  @OneToOne(() => Member, (member) => member.result, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'member_id' }) member!: Relation<Member>;
  @ManyToOne(() => Product, { onDelete: 'SET NULL', nullable: true }) @JoinColumn({ name: 'product_id' }) product!: Relation<Product> | null;
}
