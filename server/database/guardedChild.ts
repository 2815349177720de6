import { type ChildProcess, type SpawnOptions, spawn } from 'node:child_process';
import { findProgram } from './programs.ts';

/**
 * Starts a program in a session of its own, so that a terminal's Ctrl-C reaches this process first and the program when
 * it is its turn. Where `setpriv` exists, the system sends the program SIGTERM should this process die without a word.
 */
export function spawnGuarded(program: string, args: string[], options: SpawnOptions): ChildProcess {
  const guard = findProgram('setpriv');
  return guard
    ? spawn(guard, ['--pdeathsig', 'TERM', program, ...args], { ...options, detached: true })
    : spawn(program, args, { ...options, detached: true });
}
