import { readFileSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';

/**
 * When a process started, in clock ticks since boot with the boot it belongs to; `undefined` when it is gone.
 * A process id alone is reused sooner or later, the pair is not.
 */
export function startTimeOf(pid: number): string | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name in parentheses may hold spaces, so fields are counted from the last one: state is field 3, start time 22.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    if (fields[0] === 'Z' || fields[0] === 'X') return undefined;
    return `${readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim()}:${fields[19]}`;
  } catch {
    return undefined;
  }
}

/** The words of a running process's command line; empty when it is gone. */
export function commandLineOf(pid: number): string[] {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
  } catch {
    return [];
  }
}

/** Waits until a process that is not our child is gone; false when it is still there after `milliseconds`. */
export async function goneWithin(pid: number, milliseconds: number): Promise<boolean> {
  const startTime = startTimeOf(pid);
  const end = Date.now() + milliseconds;
  while (startTime !== undefined && startTimeOf(pid) === startTime) {
    if (Date.now() > end) return false;
    // The system tells only parents when a process ends, so anyone else has to look.
    await sleep(25);
  }
  return true;
}
