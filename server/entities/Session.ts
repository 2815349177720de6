import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The table of express-mysql-session, column by column as that package reads and writes it. */
@Entity('sessions')
export class Session {
  @PrimaryColumn({ name: 'session_id', type: 'varchar', length: 128, charset: 'utf8mb4', collation: 'utf8mb4_bin' })
  sessionId!: string;

  /** Unix seconds. */
  @Column({ type: 'int', unsigned: true })
  expires!: number;

  @Column({ type: 'mediumtext', charset: 'utf8mb4', collation: 'utf8mb4_bin', nullable: true })
  data!: string | null;
}
