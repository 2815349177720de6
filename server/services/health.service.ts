import packageJson from '../../package.json' with { type: 'json' };
import type { Deps } from '../deps.ts';

/** Answers when the database does. */
export async function checkHealth(deps: Deps): Promise<{ ok: true; version: string }> {
  await deps.dataSource.query('SELECT 1');
  return { ok: true, version: packageJson.version };
}
