import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { Tolerances } from '../../shared/reading/tolerances.ts';

/** A production; everything but people belongs to one. */
@Entity('productions')
export class Production {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Column({ type: 'varchar', length: 60, unique: true })
  slug!: string;

  @Column({ type: 'varchar', length: 120 })
  name!: string;

  /** Null: the defaults, also when they change in a later version. */
  @Column({ type: 'json', nullable: true })
  tolerances!: Tolerances | null;

  /** Number of the newest event. Every write locks this row first, so events are numbered without gaps. */
  @Column({ type: 'int', default: 0 })
  eventSeq!: number;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt!: Date;
}
