import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Draft } from './Draft.ts';

/** A picture of a post that is being put together. */
@Entity('draft_pictures')
export class DraftPicture {
  @PrimaryColumn({ type: 'uuid' })
  draftId!: string;

  /** As the person knows the file. Compared byte by byte: `A.png` and `a.png` are two files. */
  @PrimaryColumn({ type: 'varchar', length: 255, charset: 'utf8mb4', collation: 'utf8mb4_bin' })
  name!: string;

  /** Our own name for the file in the draft's folder; never the name it was chosen under. */
  @Column({ type: 'varchar', length: 40 })
  file!: string;

  @Column({ type: 'varchar', length: 10 })
  format!: 'png' | 'jpeg' | 'webp';

  @Column({ type: 'int' })
  width!: number;

  @Column({ type: 'int' })
  height!: number;

  @ManyToOne(() => Draft, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'draftId' })
  draft!: Relation<Draft>;
}
