import { readOrMakeSecrets } from '../../database/secrets.ts';
import { databaseOf, readEnv } from '../../env.ts';
import { startServer } from '../../main.ts';
import { closeWithin, greet } from '../start/serve.ts';

// Started again by `npm run dev` on every change; the database is somebody else's business here.
const settings = readEnv(process.env);
const database = databaseOf(settings.DATABASE_URL ?? '');
if (!database) throw new Error('server/scripts/dev/serve.ts is started by npm run dev, which names the database.');
const { sessionSecret } = await readOrMakeSecrets(settings.DATA_DIR);
const server = await startServer({
  env: { ...settings, SESSION_SECRET: settings.SESSION_SECRET ?? sessionSecret },
  database,
});
greet({ ...server, url: process.env.CLIENT_URL ?? server.url });

let closing: Promise<void> | undefined;
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
  process.on(signal, () => {
    closing ??= closeWithin(server.close(), 3_000).then(() => process.exit(0));
  });
}
