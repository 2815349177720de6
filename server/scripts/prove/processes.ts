import { readdirSync, readFileSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';

/**
 * What of a folder's processes is still running after its run has ended. The compiler that tsx calls ends on its own
 * when its parent is gone, so a moment is allowed; the answer comes as soon as nothing is left.
 */
export async function leftRunning(folder: string): Promise<string[]> {
  const end = Date.now() + 2_000;
  while (processesNaming(folder).length > 0 && Date.now() < end) await sleep(20);
  return processesNaming(folder);
}

/** The command lines of all other processes that were told of a folder, in their words or their settings. */
export function processesNaming(folder: string): string[] {
  return readdirSync('/proc')
    .filter((entry) => /^\d+$/.test(entry) && Number(entry) !== process.pid)
    .map((pid) => ({ words: read(`/proc/${pid}/cmdline`), settings: read(`/proc/${pid}/environ`) }))
    .filter(({ words, settings }) => `${words}\0${settings}`.includes(folder))
    .map(({ words }) => words.replaceAll('\0', ' ').trim())
    .filter((words) => words !== '');
}

function read(file: string): string {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    // It ended while we were looking, or belongs to somebody else.
    return '';
  }
}
