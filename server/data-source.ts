import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { Start1796147170942 } from './migrations/1796147170942-Start.ts';
import { Decision } from './entities/Decision.ts';
import { Draft } from './entities/Draft.ts';
import { DraftPicture } from './entities/DraftPicture.ts';
import { Membership } from './entities/Membership.ts';
import { Note } from './entities/Note.ts';
import { NoteStamp } from './entities/NoteStamp.ts';
import { Production } from './entities/Production.ts';
import { ProductionEvent } from './entities/ProductionEvent.ts';
import { Reading } from './entities/Reading.ts';
import { Session } from './entities/Session.ts';
import { Shot } from './entities/Shot.ts';
import { Take } from './entities/Take.ts';
import { TakeFrame } from './entities/TakeFrame.ts';
import { TakeStamp } from './entities/TakeStamp.ts';
import { Thread } from './entities/Thread.ts';
import { User } from './entities/User.ts';
import type { DatabaseConnection } from './env.ts';

/** Every table there is. */
export const ENTITIES = [
  User,
  Production,
  Membership,
  Shot,
  Take,
  TakeFrame,
  Reading,
  Thread,
  Note,
  NoteStamp,
  TakeStamp,
  Decision,
  ProductionEvent,
  Draft,
  DraftPicture,
  Session,
];

/** In the order they run. A migration is never edited after it was merged; write the next one. */
export const MIGRATIONS = [Start1796147170942];

/**
 * The one way to the database. Type `mariadb` and not `mysql`: the latter sees drift in every nullable column here.
 * Dates are UTC on both ends.
 */
export function createDataSource(database: DatabaseConnection): DataSource {
  return new DataSource({
    type: 'mariadb',
    host: database.host,
    port: database.port,
    username: database.user,
    password: database.password,
    database: database.database,
    entities: ENTITIES,
    migrations: MIGRATIONS,
    synchronize: false,
    timezone: 'Z',
    charset: 'utf8mb4',
    poolSize: 10,
    relationLoadStrategy: 'join',
  });
}
