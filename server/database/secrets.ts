import { randomBytes } from 'node:crypto';
import { readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { z } from 'zod';
import { StartupError } from './startupError.ts';

const secretsSchema = z.object({
  databasePassword: z.string().regex(/^[\w-]{32,}$/),
  sessionSecret: z.string().min(32),
});

/** What one installation knows and nobody else: made once, kept in `secrets.json` of the data folder. */
export type Secrets = z.infer<typeof secretsSchema>;

/**
 * Reads the secrets of a data folder, or makes them on the first start. The file is readable by its owner only.
 * @throws {StartupError} when the file is there and broken: making new secrets would sign everyone out unasked.
 */
export async function readOrMakeSecrets(dataDir: string): Promise<Secrets> {
  const file = path.join(dataDir, 'secrets.json');
  const text = await readFile(file, 'utf8').catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return undefined;
    throw error;
  });
  if (text !== undefined) return parseSecrets(text, file);
  const secrets: Secrets = {
    databasePassword: randomBytes(32).toString('base64url'),
    sessionSecret: randomBytes(48).toString('base64url'),
  };
  const draft = `${file}.${process.pid}`;
  try {
    await writeFile(draft, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600, flush: true });
    await rename(draft, file);
  } finally {
    await rm(draft, { force: true });
  }
  return secrets;
}

function parseSecrets(text: string, file: string): Secrets {
  try {
    return secretsSchema.parse(JSON.parse(text));
  } catch {
    throw new StartupError(`${file} is damaged; put it back from a copy, or delete it to have new secrets made.`);
  }
}
