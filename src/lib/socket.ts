import { io, type Socket } from 'socket.io-client';
import type { ClientToServerEvents, ServerToClientEvents } from '../../shared/events.ts';

export type ProductionSocket = Socket<ServerToClientEvents, ClientToServerEvents>;

/** The one socket of this tab. It connects when a production is opened; writes go over HTTP. */
export const socket: ProductionSocket = io({ autoConnect: false });
