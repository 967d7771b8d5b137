import type { MemberType } from '@mantlet/common';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import type { Relation } from 'typeorm';
import { Product } from '../products/product.entity.js';
import { Zone } from './zone.entity.js';

/** The protection system of one member type in one zone. */
@Entity('zone_systems')
export class ZoneSystem {
  @PrimaryColumn('uuid') zoneId!: string;
  @PrimaryColumn('text') memberType!: MemberType;
  @Index() @Column('uuid') productId!: string;
  @ManyToOne(() => Zone, (zone) => zone.systems, { onDelete: 'CASCADE' }) @JoinColumn({ name: 'zone_id' }) zone!: Relation<Zone>;
  @ManyToOne(() => Product, { onDelete: 'RESTRICT' }) @JoinColumn({ name: 'product_id' }) product!: Relation<Product>;
}
