import { once } from 'node:events';
import { io, type Socket } from 'socket.io-client';
import type { ProductionEvent, ProductionEventKind } from '../../shared/api/events.ts';
import {
  type ClientToServerEvents,
  type JoinAnswer,
  PROTOCOL_VERSION,
  type ServerToClientEvents,
} from '../../shared/events.ts';
import type { Client } from './client.ts';
import type { TestServer } from './testServer.ts';

/** A tab with a production open: a real socket and what it heard, in the order it was heard. */
export interface LiveClient {
  socket: Socket<ServerToClientEvents, ClientToServerEvents>;
  heard: ProductionEvent[];
  join(slug: string): Promise<JoinAnswer>;
  /** The next event of a kind, also one that was heard since the last call for this kind. */
  next<K extends ProductionEventKind>(kind: K): Promise<Extract<ProductionEvent, { kind: K }>>;
  /** Waits until this many events were heard. */
  until(count: number): Promise<void>;
  close(): void;
}

/** Opens a socket with the session of a client and waits until it is let in. */
export async function goLive(
  server: TestServer,
  client: Client | null,
  headers: Record<string, string> = {},
): Promise<LiveClient> {
  const socket: LiveClient['socket'] = io(server.url, {
    extraHeaders: { ...headers, ...(client ? { Cookie: client.cookie() } : {}) },
    reconnection: false,
    forceNew: true,
  });
  const heard: ProductionEvent[] = [];
  const listeners = new Set<() => void>();
  socket.on('production:event', ({ slug: _slug, ...event }) => {
    heard.push(event as ProductionEvent);
    for (const listener of listeners) listener();
  });
  const told = <T>(look: () => T | undefined): Promise<T> =>
    new Promise((resolve) => {
      const listener = () => {
        const found = look();
        if (found === undefined) return;
        listeners.delete(listener);
        resolve(found);
      };
      listeners.add(listener);
      listener();
    });
  const taken = new Set<ProductionEvent>();
  await new Promise<void>((resolve, reject) => {
    socket.once('connect', resolve);
    socket.once('connect_error', reject);
  });
  return {
    socket,
    heard,
    join: (slug) => socket.emitWithAck('production:join', { slug, protocol: PROTOCOL_VERSION }),
    next: (kind) =>
      told(() => {
        const event = heard.find((each) => each.kind === kind && !taken.has(each));
        if (event) taken.add(event);
        return event as never;
      }),
    until: async (count) => {
      await told(() => (heard.length >= count ? true : undefined));
    },
    close: () => socket.disconnect(),
  };
}

/** Waits for a message of the server that is no event of a production. */
export async function message(client: LiveClient, name: keyof ServerToClientEvents): Promise<unknown> {
  const [payload] = await once(client.socket as unknown as NodeJS.EventEmitter, name);
  return payload;
}
