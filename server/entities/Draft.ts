import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { RefusedFile } from '../../shared/api/drafts.ts';
import type { Grid } from '../../shared/finding/grid.ts';
import { Production } from './Production.ts';
import { User } from './User.ts';

/** A post that is being put together; nobody else sees it. */
@Entity('drafts')
export class Draft {
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Column({ type: 'uuid' })
  productionId!: string;

  @Column({ type: 'uuid' })
  userId!: string;

  /** `posting` keeps a second click from posting the same strip twice. */
  @Column({ type: 'varchar', length: 10, default: 'open' })
  status!: 'open' | 'posting' | 'posted';

  /** How the only picture is cut; null for a numbered set, or where someone said it is one frame. */
  @Column({ type: 'json', nullable: true })
  grid!: Grid | null;

  @Column({ type: 'json' })
  refused!: RefusedFile[];

  @Index()
  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  touchedAt!: Date;

  @ManyToOne(() => Production, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'productionId' })
  production!: Relation<Production>;

  @ManyToOne(() => User, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'userId' })
  user!: Relation<User>;
}
