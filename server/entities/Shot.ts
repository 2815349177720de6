import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation, Unique } from 'typeorm';
import { Production } from './Production.ts';

/** A shot: what takes are takes of. */
@Entity('shots')
@Unique(['productionId', 'number'])
export class Shot {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Column({ type: 'uuid' })
  productionId!: string;

  @Column({ type: 'varchar', length: 40 })
  number!: string;

  @Column({ type: 'varchar', length: 120 })
  title!: string;

  /** Highest take number ever given here: a number that was moved away is not given again. */
  @Column({ type: 'int', default: 0 })
  lastTakeNumber!: number;

  /** Number of the event that changed this shot last. */
  @Column({ type: 'int', default: 0 })
  revision!: number;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt!: Date;

  @ManyToOne(() => Production, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'productionId' })
  production!: Relation<Production>;
}
