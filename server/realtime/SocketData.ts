import type { Person } from '../../shared/api/people.ts';

/** What the server keeps with a socket. */
export interface SocketData {
  person: Person;
  sessionId: string;
  /** Slugs by the id of the productions this socket has open. */
  open: Map<string, string>;
}
