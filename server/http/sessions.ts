import type { RequestHandler } from 'express';
import mysqlSession from 'express-mysql-session';
import session from 'express-session';
import { createPool } from 'mysql2';
import type { DatabaseConnection } from '../env.ts';

type StorePool = ConstructorParameters<ReturnType<typeof mysqlSession>>[1];

/** Name of the cookie that carries the session. */
export const SESSION_COOKIE = 'spandrel.sid';
const TWO_WEEKS = 14 * 24 * 60 * 60 * 1000;
const TOUCH_EVERY = 60 * 1000;

export interface SessionOptions {
  database: DatabaseConnection;
  secret: string;
  /** Whether people reach us over https; the cookie is then never sent in the clear. */
  secure: boolean;
}

/** The sessions of the server: the middleware, shared by HTTP and sockets, and the store behind it. */
export interface Sessions {
  middleware: RequestHandler;
  /** Whether a session is still there and not over. */
  isAlive(sessionId: string): Promise<boolean>;
  close(): Promise<void>;
}

/** express-session over MariaDB, on a pool of its own; the table comes with our migrations. */
export function createSessions({ database, secret, secure }: SessionOptions): Sessions {
  const pool = createPool({ ...database, connectionLimit: 5, timezone: 'Z', charset: 'utf8mb4' });
  const MysqlStore = mysqlSession(session);
  // The store's types come with a mysql2 of their own; at run time it is given ours.
  const store = new MysqlStore({ createDatabaseTable: false }, pool as unknown as StorePool);
  throttleTouch(store);
  const middleware = session({
    name: SESSION_COOKIE,
    secret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure, maxAge: TWO_WEEKS, path: '/' },
  });
  return {
    middleware,
    isAlive: async (sessionId) => Boolean(await store.get(sessionId)),
    close: async () => {
      await store.close();
      await pool.promise().end();
    },
  };
}

/**
 * express-session touches the store on every request, which is one UPDATE each. A minute's precision is enough for a
 * session of two weeks.
 */
function throttleTouch(store: session.Store): void {
  const touch = store.touch?.bind(store);
  const touchedAt = new Map<string, number>();
  store.touch = (sessionId, data, done) => {
    const now = Date.now();
    if (now - (touchedAt.get(sessionId) ?? 0) < TOUCH_EVERY) return done?.();
    // Forgetting all of them costs one UPDATE each and keeps the map small.
    if (touchedAt.size > 10_000) touchedAt.clear();
    touchedAt.set(sessionId, now);
    touch?.(sessionId, data, done);
  };
}
