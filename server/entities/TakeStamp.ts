import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { StampKind } from '../../shared/api/stamps.ts';
import { Take } from './Take.ts';
import { User } from './User.ts';

/** One kind of stamp by one person on a take. */
@Entity('take_stamps')
export class TakeStamp {
  @PrimaryColumn({ type: 'uuid' })
  takeId!: string;

  @PrimaryColumn({ type: 'uuid' })
  userId!: string;

  /** An ASCII word: two pictograms may be equal to a collation. */
  @PrimaryColumn({ type: 'varchar', length: 20 })
  kind!: StampKind;

  /** Number of the event that set it: the order in which kinds were first used. */
  @Column({ type: 'int' })
  seq!: number;

  @ManyToOne(() => Take, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'takeId' })
  take!: Relation<Take>;

  @ManyToOne(() => User, { nullable: false })
  @JoinColumn({ name: 'userId' })
  user!: Relation<User>;
}
