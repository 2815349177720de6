import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Thread } from './Thread.ts';
import { User } from './User.ts';

/** Something said in a thread: the note that was pinned, or a reply. */
@Entity('notes')
export class Note {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Index()
  @Column({ type: 'uuid' })
  threadId!: string;

  @Column({ type: 'uuid' })
  authorId!: string;

  @Column({ type: 'text' })
  body!: string;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  writtenAt!: Date;

  /** Number of the event that brought it: the order of a thread, exact where two clocks would not be. */
  @Column({ type: 'int' })
  seq!: number;

  /** Number of the event that changed its stamps last. */
  @Column({ type: 'int', default: 0 })
  stampsRevision!: number;

  @ManyToOne(() => Thread, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'threadId' })
  thread!: Relation<Thread>;

  @ManyToOne(() => User, { nullable: false })
  @JoinColumn({ name: 'authorId' })
  author!: Relation<User>;
}
