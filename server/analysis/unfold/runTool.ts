import { spawn } from 'node:child_process';

/** Longest time and most memory for taking one file apart. */
const TIMEOUT_MS = 120_000;
const MEMORY_KB = 2_000_000;
const MOST_OUTPUT = 32 * 1024 * 1024;

/** A tool that did not do what it was asked to: not there, too slow, or not content with the file. */
export class ToolError extends Error {
  override readonly name = 'ToolError';
  readonly reason: 'missing' | 'timeout' | 'failed';

  constructor(reason: ToolError['reason'], message: string) {
    super(message);
    this.reason = reason;
  }
}

/**
 * Runs a program with limits on time, memory and output, without a shell seeing the arguments.
 * @returns what it wrote on standard output
 * @throws ToolError when it is not there, is killed, or exits with an error
 */
export function runTool(program: string, args: string[]): Promise<string> {
  return new Promise((resolve, reject) => {
    // The limit is set by a shell that then becomes the program; arguments go through "$@" and are never parsed.
    const limited = ['-c', `ulimit -v ${MEMORY_KB}; exec "$0" "$@"`, program, ...args];
    const child = spawn('/bin/sh', limited, {
      stdio: ['ignore', 'pipe', 'pipe'],
      timeout: TIMEOUT_MS,
      killSignal: 'SIGKILL',
    });
    let output = '';
    let complaint = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      output += text;
      if (output.length > MOST_OUTPUT) child.kill('SIGKILL');
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => {
      complaint = (complaint + text).slice(-4000);
    });
    child.on('error', (cause) => reject(new ToolError('missing', cause.message)));
    child.on('close', (code, signal) => {
      if (code === 0) resolve(output);
      else if (code === 127) reject(new ToolError('missing', `${program} is not installed.`));
      else reject(new ToolError(signal ? 'timeout' : 'failed', complaint));
    });
  });
}
