import { accessSync, constants } from 'node:fs';
import path from 'node:path';

/** Where a program is, looking also where Debian keeps servers, which is not in every user's PATH. */
export function findProgram(name: string): string | undefined {
  const folders = [...(process.env.PATH ?? '').split(path.delimiter), '/usr/sbin', '/usr/local/sbin'];
  return folders.map((folder) => path.join(folder, name)).find(isExecutable);
}

function isExecutable(file: string): boolean {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
