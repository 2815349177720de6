import type { RunningServer } from '../../main.ts';

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
