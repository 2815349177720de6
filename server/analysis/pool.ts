import { availableParallelism } from 'node:os';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { MessageChannel } from 'node:worker_threads';
import { Tinypool } from 'tinypool';
import type { AnalysisProgress, AnalysisRequest, AnalysisResult, ReportProgress } from '../../shared/finding/types.ts';
import { AnalysisError } from './AnalysisError.ts';
import type { AnalysisAnswer, AnalysisTask } from './messages.ts';
import { PictureError } from './PictureError.ts';

export interface AnalysisPoolOptions {
  /** Worker threads; by default one less than the machine has cores, and at least one. */
  threads?: number;
  /** Longest time one analysis may take, ms; by default `ANALYSIS_TIMEOUT_MS`, or two minutes. */
  timeoutMs?: number;
  /** Analyses that may wait for a thread. */
  queueLimit?: number;
  /** Heap of one worker, MB. Decoded pictures lie outside it and are bounded by the pixel limit. */
  heapMb?: number;
  /** The file that runs in the worker and exports `analyse`; tests put one there that hangs or crashes. */
  entry?: string;
}

export interface AnalysisPool {
  /**
   * Reads a take in a worker thread.
   * @throws PictureError when a frame cannot be used
   * @throws AnalysisError when it took too long, was cancelled, broke, or too many are waiting
   */
  analyse(request: AnalysisRequest, report: ReportProgress, signal?: AbortSignal): Promise<AnalysisResult>;
  /** Ends all workers, those at work too; nothing keeps the process alive afterwards. */
  close(): Promise<void>;
}

const DEFAULT_TIMEOUT_MS = 120_000;
const DEFAULT_ENTRY = fileURLToPath(new URL('./entry/analysisWorker.ts', import.meta.url));

/** Starts a pool of worker threads for analyses. Threads start with the first job and stay warm. */
export function createAnalysisPool(options: AnalysisPoolOptions = {}): AnalysisPool {
  const threads = options.threads ?? Math.max(1, availableParallelism() - 1);
  const timeoutMs = options.timeoutMs ?? (Number(process.env.ANALYSIS_TIMEOUT_MS) || DEFAULT_TIMEOUT_MS);
  const queueLimit = options.queueLimit ?? 256;
  const pool = new Tinypool({
    runtime: 'worker_threads',
    filename: new URL('./entry/start.mjs', import.meta.url).href,
    workerData: { entry: pathToFileURL(options.entry ?? DEFAULT_ENTRY).href },
    name: 'analyse',
    minThreads: 0,
    maxThreads: threads,
    maxQueue: threads,
    idleTimeout: 60_000,
    resourceLimits: { maxOldGenerationSizeMb: options.heapMb ?? 768 },
    execArgv: [],
    env: { ...process.env, NODE_OPTIONS: '' } as Record<string, string>,
  });
  // A thread that dies while idle takes no job with it; the pool starts another.
  pool.on('error', () => undefined);
  const closing = new AbortController();
  const turns = createTurns(threads, queueLimit);

  async function analyse(
    request: AnalysisRequest,
    report: ReportProgress,
    signal?: AbortSignal,
  ): Promise<AnalysisResult> {
    const cancelled = AbortSignal.any([closing.signal, ...(signal ? [signal] : [])]);
    const release = await turns.take(cancelled);
    // The clock starts with the work: waiting in the queue is not the job's fault.
    const deadline = AbortSignal.timeout(timeoutMs);
    const { port1, port2 } = new MessageChannel();
    port1.on('message', (message: AnalysisProgress) => report(message));
    // The worker's end of the port closes with the worker: a thread that exits by itself would else never answer.
    const gone = new AbortController();
    port1.on('close', () => gone.abort());
    try {
      const task: AnalysisTask = { request, progress: port2 };
      const answer: AnalysisAnswer = await pool.run(task, {
        transferList: [port2],
        signal: AbortSignal.any([deadline, cancelled, gone.signal]),
      });
      if (answer.ok) return answer.result;
      throw new PictureError(answer.error.file, answer.error.code, answer.error.message);
    } catch (cause) {
      if (cause instanceof PictureError) throw cause;
      if (cancelled.aborted) throw cancelledError();
      if (deadline.aborted) throw lateError(timeoutMs);
      throw new AnalysisError('analysis_failed', 'Reading the take failed; its frames are kept, read it again.', {
        cause,
      });
    } finally {
      port1.close();
      release();
    }
  }

  return {
    analyse,
    close: async () => {
      closing.abort();
      await pool.destroy();
    },
  };
}

function cancelledError(): AnalysisError {
  return new AnalysisError('analysis_cancelled', 'Reading the take was cancelled.');
}

function lateError(timeoutMs: number): AnalysisError {
  const seconds = Math.max(1, Math.round(timeoutMs / 1000));
  return new AnalysisError('analysis_timeout', `Reading the take took longer than ${seconds} s and was stopped.`);
}

interface Turns {
  /** Waits for a free thread; the answer gives it back. */
  take(signal: AbortSignal): Promise<() => void>;
}

function createTurns(threads: number, queueLimit: number): Turns {
  let free = threads;
  const waiting: (() => void)[] = [];
  const release = (): void => {
    free++;
    waiting.shift()?.();
  };
  return {
    async take(signal) {
      if (signal.aborted) throw cancelledError();
      if (free === 0) {
        if (waiting.length >= queueLimit) {
          throw new AnalysisError(
            'analysis_busy',
            'Too many takes are waiting to be read; try again in a few minutes.',
          );
        }
        await new Promise<void>((resolve, reject) => {
          const go = (): void => {
            signal.removeEventListener('abort', leave);
            resolve();
          };
          const leave = (): void => {
            waiting.splice(waiting.indexOf(go), 1);
            reject(cancelledError());
          };
          waiting.push(go);
          signal.addEventListener('abort', leave, { once: true });
        });
      }
      free--;
      return release;
    },
  };
}
