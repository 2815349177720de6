import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { ReviewState } from '../../shared/api/takes.ts';
import { Take } from './Take.ts';
import { User } from './User.ts';

/** Every decision is kept; the one with the highest `seq` counts. */
@Entity('decisions')
export class Decision {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Index()
  @Column({ type: 'uuid' })
  takeId!: string;

  @Column({ type: 'uuid' })
  byId!: string;

  @Column({ type: 'varchar', length: 20 })
  state!: Exclude<ReviewState, 'waiting'>;

  @Column({ type: 'text' })
  remark!: string;

  @Column({ type: 'int' })
  seq!: number;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  decidedAt!: Date;

  @ManyToOne(() => Take, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'takeId' })
  take!: Relation<Take>;

  @ManyToOne(() => User, { nullable: false })
  @JoinColumn({ name: 'byId' })
  by!: Relation<User>;
}
