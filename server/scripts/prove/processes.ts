import { readdirSync, readFileSync } from 'node:fs';

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
