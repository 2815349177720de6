import { z } from 'zod';
import type { ProductionEvent } from './api/events.ts';
import { slugSchema } from './api/names.ts';
import type { Person } from './api/people.ts';
import type { ReadingProgress } from './api/takes.ts';
import type { Problem } from './errors.ts';

/** Grows when an older client can no longer follow; the client then asks for a reload. */
export const PROTOCOL_VERSION = 1;

export const joinSchema = z.object({ slug: slugSchema, protocol: z.int() });
export type Join = z.infer<typeof joinSchema>;

/** Answer to `production:join`: the newest event number, so that the client knows what it missed. */
export type JoinAnswer = { ok: true; newest: number; here: Person[] } | { ok: false; problem: Problem };

/** What the server says over the socket. */
export interface ServerToClientEvents {
  'production:event': (event: ProductionEvent & { slug: string }) => void;
  'take:progress': (progress: ReadingProgress) => void;
  'production:here': (here: { slug: string; people: Person[] }) => void;
  /** The session ended: sign-out in another tab, or access taken away. */
  'session:ended': () => void;
}

/** What a client may say over the socket. Writes go over HTTP. */
export interface ClientToServerEvents {
  'production:join': (join: Join, answer: (answer: JoinAnswer) => void) => void;
  'production:leave': (leave: { slug: string }) => void;
}

export const productionRoom = (productionId: string) => `production:${productionId}`;
export const sessionRoom = (sessionId: string) => `session:${sessionId}`;
