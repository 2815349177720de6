import type { DatabaseConnection, Env } from '../../env.ts';

export interface RunningServer {
  url: string;
  close(): Promise<void>;
  demoSignIns: { name: string; email: string; password: string; role: string }[];
}
export interface MainModule {
  startServer(parts: { env: Env & { SESSION_SECRET: string }; database: DatabaseConnection }): Promise<RunningServer>;
}
/** Loads the application. */
export async function loadMain(): Promise<MainModule> {
  const file: string = new URL('../../main.ts', import.meta.url).href;
  return import(file);
}

/** Prints where Spandrel is and who can sign in. */
export function greet({ url, demoSignIns }: RunningServer): void {
  console.log(`\nSpandrel is ready at ${url}\n`);
  for (const { name, email, password, role } of demoSignIns) {
    console.log(`  ${role.padEnd(9)} ${name.padEnd(18)} ${email.padEnd(30)} ${password}`);
  }
  console.log(`${demoSignIns.length > 0 ? '\n' : ''}Ctrl-C stops it.`);
}

/** Waits for a closing server, but not for ever: a client that hangs on must not keep the database from closing. */
export async function closeWithin(closing: Promise<void>, milliseconds: number): Promise<void> {
  let patience: NodeJS.Timeout | undefined;
  const tooLong = new Promise<void>((resolve) => {
    patience = setTimeout(resolve, milliseconds);
  });
  await Promise.race([closing, tooLong]);
  clearTimeout(patience);
}
