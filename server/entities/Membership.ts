import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { Role } from '../../shared/api/people.ts';
import { Production } from './Production.ts';
import { User } from './User.ts';

/** Who is on a production, and as what. */
@Entity('memberships')
export class Membership {
  @PrimaryColumn({ type: 'uuid' })
  productionId!: string;

  @Index()
  @PrimaryColumn({ type: 'uuid' })
  userId!: string;

  @Column({ type: 'varchar', length: 20 })
  role!: Role;

  @Column({ type: 'datetime', precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  joinedAt!: Date;

  @ManyToOne(() => Production, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'productionId' })
  production!: Relation<Production>;

  @ManyToOne(() => User, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'userId' })
  user!: Relation<User>;
}
