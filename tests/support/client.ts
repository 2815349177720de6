import supertest, { type Test } from 'supertest';
import type { User } from '../../server/entities/User.ts';
import { PASSWORD } from './factories.ts';
import type { TestServer } from './testServer.ts';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** A browser of sorts: it sends our origin, as pages do, and keeps its cookie. */
export interface Client {
  request(method: Method, path: string): Test;
  get(path: string): Test;
  post(path: string, body?: object): Test;
  put(path: string): Test;
  patch(path: string, body?: object): Test;
  delete(path: string): Test;
  /** The session cookie, for a socket. */
  cookie(): string;
}

/** Nobody: a client without a session. Paths are below /api. */
export function openClient({ url }: TestServer): Client {
  const agent = supertest.agent(url);
  let cookie = '';
  const request = (method: Method, path: string): Test => {
    const test = agent[method](`/api${path}`).set('Origin', url);
    return test.on('response', (response: { headers: Record<string, string[] | undefined> }) => {
      const [set] = response.headers['set-cookie'] ?? [];
      if (set) cookie = set.split(';')[0]!;
    });
  };
  return {
    request,
    get: (path) => request('get', path),
    post: (path, body) => request('post', path).send(body),
    put: (path) => request('put', path),
    patch: (path, body) => request('patch', path).send(body),
    delete: (path) => request('delete', path),
    cookie: () => cookie,
  };
}

/** Signs someone in the way people do. */
export async function signIn(server: TestServer, user: User, password = PASSWORD): Promise<Client> {
  const client = openClient(server);
  await client.post('/session', { email: user.email, password }).expect(200);
  return client;
}
