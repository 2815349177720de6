import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation, Unique } from 'typeorm';
import type { ReviewState } from '../../shared/api/takes.ts';
import type { Hold } from '../../shared/reading/document.ts';
import { Production } from './Production.ts';
import { Shot } from './Shot.ts';
import { User } from './User.ts';

export type ReadingStatus = 'queued' | 'reading' | 'read' | 'failed';

/** A strip as it was posted, with what became of it. */
@Entity('takes')
@Unique(['shotId', 'number'])
@Unique(['productionId', 'postedSeq'])
export class Take {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Column({ type: 'uuid' })
  productionId!: string;

  @Column({ type: 'uuid' })
  shotId!: string;

  @Column({ type: 'int' })
  number!: number;

  @Column({ type: 'uuid' })
  postedById!: string;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  postedAt!: Date;

  /** Number of the event that posted it: the order of the feed. */
  @Column({ type: 'int' })
  postedSeq!: number;

  /** Number of the event that changed this take last. */
  @Column({ type: 'int' })
  revision!: number;

  /** Number of the event that changed its stamps last. */
  @Column({ type: 'int', default: 0 })
  stampsRevision!: number;

  @Column({ type: 'varchar', length: 20, default: 'waiting' })
  review!: ReviewState;

  @Index()
  @Column({ type: 'varchar', length: 20, default: 'queued' })
  readingStatus!: ReadingStatus;

  @Column({ type: 'varchar', length: 500, nullable: true })
  readingMessage!: string | null;

  @Column({ type: 'varchar', length: 10 })
  kind!: 'frames' | 'strip';

  @Column({ type: 'int' })
  fpsNum!: number;

  @Column({ type: 'int' })
  fpsDen!: number;

  /** As it was posted; null: found from the drawings. */
  @Column({ type: 'json', nullable: true })
  hold!: Hold | null;

  @Column({ type: 'int' })
  firstFrame!: number;

  @Column({ type: 'int' })
  frames!: number;

  @Column({ type: 'int' })
  width!: number;

  @Column({ type: 'int' })
  height!: number;

  @Column({ type: 'text' })
  changed!: string;

  @Column({ type: 'text' })
  intended!: string;

  @Column({ type: 'json' })
  missingFrames!: number[];

  @ManyToOne(() => Production, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'productionId' })
  production!: Relation<Production>;

  @ManyToOne(() => Shot, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shotId' })
  shot!: Relation<Shot>;

  @ManyToOne(() => User, { nullable: false })
  @JoinColumn({ name: 'postedById' })
  postedBy!: Relation<User>;
}
