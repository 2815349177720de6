import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import type { Broadcast } from './realtime/broadcast.ts';
import type { ReadingQueue } from './services/readingQueue.ts';

/** What the services work with. Made once at boot and handed down; nothing reaches for a global. */
export interface Deps {
  dataSource: DataSource;
  /** Absolute folder of everything that is not in the database. */
  dataDir: string;
  broadcast: Broadcast;
  readings: ReadingQueue;
  /** The time of what is written. The demo production tells days in seconds. */
  now: () => Date;
  log: Logger;
}
