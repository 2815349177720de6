import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Take } from './Take.ts';

/** A talk pinned to a frame of a take. Its first note is what was pinned. */
@Entity('threads')
export class Thread {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Index()
  @Column({ type: 'uuid' })
  takeId!: string;

  /** Frame of the document, from 1. */
  @Column({ type: 'int' })
  frame!: number;

  @ManyToOne(() => Take, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'takeId' })
  take!: Relation<Take>;
}
