import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { type AnalysisPool, type AnalysisPoolOptions, createAnalysisPool } from '../../server/analysis/pool.ts';
import type { AnalysisProgress, AnalysisRequest } from '../../shared/finding/types.ts';
import { drawTake } from '../support/drawTake.ts';

const entry = (name: string): string => fileURLToPath(new URL(`./analysisEntries/${name}.ts`, import.meta.url));
const quiet = (): void => undefined;

let folder: string;
const pools: AnalysisPool[] = [];

function startPool(options: AnalysisPoolOptions): AnalysisPool {
  const pool = createAnalysisPool({ threads: 1, ...options });
  pools.push(pool);
  return pool;
}

function requestOf(framePaths: string[]): AnalysisRequest {
  return { id: 'pool', framePaths, kind: 'frames', firstFrame: 1, fps: { num: 24, den: 1 } };
}

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'spandrel-pool-'));
});

afterEach(async () => {
  await Promise.all(pools.splice(0).map((pool) => pool.close()));
  await rm(folder, { recursive: true, force: true });
});

describe('the analysis pool', { timeout: 60_000 }, () => {
  it('reads a take in a worker and reports every frame', async () => {
    const framePaths = await drawTake(folder, { frames: 16 });
    const seen: AnalysisProgress[] = [];
    const { reading } = await startPool({}).analyse(requestOf(framePaths), (progress) => seen.push(progress));
    expect(reading.objects[0].marks).toHaveLength(16);
    const found = seen.filter((progress) => progress.phase === 'finding').map((progress) => progress.done);
    expect(found).toEqual(Array.from({ length: 16 }, (_, k) => k + 1));
  });

  it('names the file when a frame cannot be used, and goes on with the next take', async () => {
    const framePaths = await drawTake(folder, { frames: 8 });
    const bad = join(folder, 'notes.png');
    await writeFile(bad, 'not a picture');
    const pool = startPool({});
    await expect(pool.analyse(requestOf([framePaths[0], bad]), quiet)).rejects.toMatchObject({
      name: 'PictureError',
      file: 'notes.png',
      code: 'not_a_picture',
    });
    await expect(pool.analyse(requestOf(framePaths), quiet)).resolves.toHaveProperty('reading');
  });

  it('kills a job that never ends at its time limit, and takes the next one', async () => {
    const pool = startPool({ entry: entry('hangsOnce'), timeoutMs: 4000 });
    await expect(pool.analyse(requestOf(['hang']), quiet)).rejects.toMatchObject({ code: 'analysis_timeout' });
    await expect(pool.analyse(requestOf(['answer']), quiet)).resolves.toHaveProperty('reading');
  });

  it('survives a worker that ends the thread, one that throws and one that eats its memory', async () => {
    const pool = startPool({ entry: entry('breaks'), heapMb: 64 });
    for (const how of ['exit', 'throw', 'memory']) {
      await expect(pool.analyse(requestOf([how]), quiet), how).rejects.toMatchObject({ code: 'analysis_failed' });
    }
    await expect(pool.analyse(requestOf(['answer']), quiet)).resolves.toHaveProperty('reading');
  });

  it('stops a job that is cancelled while it waits and one that is at work', async () => {
    const pool = startPool({ entry: entry('hangsOnce') });
    const atWork = new AbortController();
    const waiting = new AbortController();
    const first = pool.analyse(requestOf(['hang']), () => atWork.abort(), atWork.signal);
    const second = pool.analyse(requestOf(['answer']), quiet, waiting.signal);
    waiting.abort();
    await expect(second).rejects.toMatchObject({ code: 'analysis_cancelled' });
    await expect(first).rejects.toMatchObject({ code: 'analysis_cancelled' });
    await expect(pool.analyse(requestOf(['answer']), quiet)).resolves.toHaveProperty('reading');
  });

  it('refuses more takes than its queue holds', async () => {
    const pool = startPool({ entry: entry('hangsOnce'), queueLimit: 1 });
    const stop = new AbortController();
    const settled = [0, 1].map(() =>
      pool.analyse(requestOf(['hang']), quiet, stop.signal).catch((cause) => cause.code),
    );
    await expect(pool.analyse(requestOf(['answer']), quiet)).rejects.toMatchObject({ code: 'analysis_busy' });
    stop.abort();
    await expect(Promise.all(settled)).resolves.toEqual(['analysis_cancelled', 'analysis_cancelled']);
  });

  it('closes with a job at work, and takes none afterwards', async () => {
    const pool = startPool({ entry: entry('hangsOnce') });
    let started = quiet;
    const atWork = new Promise<void>((resolve) => {
      started = resolve;
    });
    const job = pool.analyse(requestOf(['hang']), () => started()).catch((cause) => cause.code);
    await atWork;
    await pool.close();
    await expect(job).resolves.toBe('analysis_cancelled');
    await expect(pool.analyse(requestOf(['answer']), quiet)).rejects.toMatchObject({ code: 'analysis_cancelled' });
  });
});
