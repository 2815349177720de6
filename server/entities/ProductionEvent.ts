import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { ProductionEventKind } from '../../shared/api/events.ts';
import { Production } from './Production.ts';
import { User } from './User.ts';

/** What happened in a production, in order. The socket sends what a row says; a client that was away asks for rows. */
@Entity('production_events')
export class ProductionEvent {
  @PrimaryColumn({ type: 'uuid' })
  productionId!: string;

  @PrimaryColumn({ type: 'int' })
  seq!: number;

  @Column({ type: 'varchar', length: 40 })
  kind!: ProductionEventKind;

  /** Null: the server did it by itself, such as a reading that is done. */
  @Column({ type: 'uuid', nullable: true })
  actorId!: string | null;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  at!: Date;

  /** The payload as JSON text, exactly as it was sent. */
  @Column({ type: 'longtext' })
  payload!: string;

  @ManyToOne(() => Production, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'productionId' })
  production!: Relation<Production>;

  @ManyToOne(() => User, { nullable: true })
  @JoinColumn({ name: 'actorId' })
  actor!: Relation<User> | null;
}
