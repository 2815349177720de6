import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Take } from './Take.ts';

/** A frame of a take that has a picture; one that was missing in the post has no row. */
@Entity('take_frames')
export class TakeFrame {
  @PrimaryColumn({ type: 'uuid' })
  takeId!: string;

  /** Frame of the document, from 1. */
  @PrimaryColumn({ type: 'int' })
  frame!: number;

  /** Our own name for the file in the take's folder; never the name it was posted under. */
  @Column({ type: 'varchar', length: 40 })
  file!: string;

  @Column({ type: 'varchar', length: 20 })
  mediaType!: string;

  @Column({ type: 'varchar', length: 255 })
  originalName!: string;

  @ManyToOne(() => Take, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'takeId' })
  take!: Relation<Take>;
}
