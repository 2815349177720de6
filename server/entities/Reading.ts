import { Column, Entity, JoinColumn, OneToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { Sketch } from '../../shared/api/takes.ts';
import { Take } from './Take.ts';

/** The newest reading of a take. */
@Entity('readings')
export class Reading {
  @PrimaryColumn({ type: 'uuid' })
  takeId!: string;

  @Column({ type: 'varchar', length: 40 })
  engine!: string;

  /** The document as JSON text; it is large, so lists never load it. */
  @Column({ type: 'longtext', select: false })
  document!: string;

  @Column({ type: 'json' })
  sketch!: Sketch;

  @Column({ type: 'int' })
  findingCount!: number;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  readAt!: Date;

  @OneToOne(() => Take, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'takeId' })
  take!: Relation<Take>;
}
