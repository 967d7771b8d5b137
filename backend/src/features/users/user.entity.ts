import { Column, CreateDateColumn, Entity, PrimaryGeneratedColumn } from 'typeorm';
import { nullableTimestamp } from '../../database/columns.js';

@Entity('users')
export class User {
  @PrimaryGeneratedColumn('uuid') id!: string;
  @Column('text') name!: string;
  /** lower case */
  @Column('text', { unique: true }) email!: string;
  /** argon2id; null until the invitation is accepted */
  @Column('text', { select: false, nullable: true }) passwordHash!: string | null;
  @Column('boolean', { default: false }) administrator!: boolean;
  @Column('boolean', { default: false }) disabled!: boolean;
  @Column(nullableTimestamp) lastSignedInAt!: Date | null;
  @CreateDateColumn({ type: 'timestamptz' }) createdAt!: Date;
}
