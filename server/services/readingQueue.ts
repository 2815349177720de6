import path from 'node:path';
import { In } from 'typeorm';
import { sayNumbers } from '../../shared/frames/frameNumbers.ts';
import type { AnalysisProgress, AnalysisRequest, ReportProgress } from '../../shared/finding/types.ts';
import { type Reading as ReadingDocument, readingSchema } from '../../shared/reading/document.ts';
import { AnalysisError } from '../analysis/AnalysisError.ts';
import { PictureError } from '../analysis/PictureError.ts';
import type { AnalysisPool } from '../analysis/pool.ts';
import { Reading } from '../entities/Reading.ts';
import { Take } from '../entities/Take.ts';
import { TakeFrame } from '../entities/TakeFrame.ts';
import type { Deps } from '../deps.ts';
import { presentSketch } from '../presenters/sketch.presenter.ts';
import { takeFolder } from '../storage/folders.ts';
import { readingId } from './readings.service.ts';
import { record } from './record.ts';
import { aboutTake } from './takes.service.ts';

/** Takes that wait to be read. The database knows which: nothing is lost when the server ends. */
export interface ReadingQueue {
  add(takeId: string): void;
  /** Puts every take in the queue that an earlier run did not finish. */
  resume(): Promise<void>;
  /** Stops what runs and waits until it has; the takes are read by the next run. */
  close(): Promise<void>;
}

type QueueDeps = Omit<Deps, 'readings'>;

interface QueueOptions {
  analysis: Pick<AnalysisPool, 'analyse'>;
  /** Takes that are read at the same time. */
  lanes: number;
}

const PROGRESS_EVERY = 120;
const FAILED = 'Reading this take failed. The frames are kept; have it read again.';

/** Reads takes in the order they came, `lanes` at a time. A reading that fails is told as an event like one that worked. */
export function createReadingQueue(deps: QueueDeps, { analysis, lanes }: QueueOptions): ReadingQueue {
  const waiting: string[] = [];
  const running = new Set<Promise<void>>();
  const closing = new AbortController();

  function next(): void {
    while (running.size < lanes && waiting.length > 0 && !closing.signal.aborted) {
      const job = readTakeNow(deps, analysis, waiting.shift()!, closing.signal).finally(() => {
        running.delete(job);
        next();
      });
      running.add(job);
    }
  }

  return {
    add(takeId) {
      waiting.push(takeId);
      next();
    },
    async resume() {
      const unfinished = await deps.dataSource.manager.find(Take, {
        where: { readingStatus: In(['queued', 'reading']) },
        select: { id: true },
        order: { postedAt: 'ASC' },
      });
      waiting.push(...unfinished.map(({ id }) => id).filter((id) => !waiting.includes(id)));
      next();
    },
    async close() {
      closing.abort();
      await Promise.allSettled(running);
    },
  };
}

/** Never rejects: whatever happens ends in the take's status, or in the log when the database is gone. */
async function readTakeNow(
  deps: QueueDeps,
  analysis: QueueOptions['analysis'],
  takeId: string,
  signal: AbortSignal,
): Promise<void> {
  try {
    const take = await deps.dataSource.manager.findOne(Take, {
      where: { id: takeId },
      relations: { shot: true, production: true },
    });
    if (!take) return;
    await deps.dataSource.manager.update(Take, { id: takeId }, { readingStatus: 'reading' });
    const request = await requestFor(deps, take);
    const report = throttled((progress) => deps.broadcast.progress(take.productionId, { takeId, ...progress }));
    report({ phase: 'decoding', done: 0, total: request.framePaths.length });
    let outcome: ReadingDocument | string;
    try {
      const { reading } = await analysis.analyse(request, report, signal);
      outcome = readingSchema.parse(sayMissing(reading, take));
    } catch (error) {
      if (signal.aborted) return;
      outcome = sentenceFor(deps, takeId, error);
    }
    await storeOutcome(deps, take, outcome);
  } catch (error) {
    if (!signal.aborted) deps.log.error({ err: error, takeId }, 'a reading could not be stored');
  }
}

async function requestFor(deps: QueueDeps, take: Take): Promise<AnalysisRequest> {
  const frames = await deps.dataSource.manager.find(TakeFrame, {
    where: { takeId: take.id },
    order: { frame: 'ASC' },
  });
  const folder = takeFolder(deps.dataDir, take.id);
  return {
    id: readingId(take.shot, take.number),
    framePaths: frames.map(({ file }) => path.join(folder, file)),
    ...(take.missingFrames.length > 0 ? { frameNumbers: frames.map(({ frame }) => frame) } : {}),
    kind: take.kind,
    firstFrame: take.firstFrame,
    fps: { num: take.fpsNum, den: take.fpsDen },
    ...(take.hold === null ? {} : { hold: take.hold }),
    ...(take.production.tolerances ? { tolerances: take.production.tolerances } : {}),
  };
}

/** Only the post knows which files were not there. */
function sayMissing(reading: ReadingDocument, { missingFrames }: Take): ReadingDocument {
  if (missingFrames.length === 0) return reading;
  const [frames, were] = missingFrames.length === 1 ? ['Frame', 'was'] : ['Frames', 'were'];
  const caution = `${frames} ${sayNumbers(missingFrames)} ${were} not posted; the arc is read from the others.`;
  return { ...reading, cautions: [caution, ...reading.cautions] };
}

/** Sentences of the analysis are for people; anything else is ours to mend and stays in the log. */
function sentenceFor(deps: QueueDeps, takeId: string, error: unknown): string {
  if (error instanceof PictureError || error instanceof AnalysisError) {
    deps.log.warn({ takeId, code: error.code, err: error.cause }, error.message);
    return error.message.slice(0, 500);
  }
  deps.log.error({ err: error, takeId }, 'a reading failed');
  return FAILED;
}

/** A string is the sentence that says why there is no reading. */
async function storeOutcome(deps: QueueDeps, take: Take, outcome: ReadingDocument | string): Promise<void> {
  await record(deps, take.productionId, null, async (recording) => {
    const { manager, seq, at } = recording;
    const takeId = take.id;
    if (typeof outcome === 'string') {
      const failed = { readingStatus: 'failed', readingMessage: outcome, revision: seq } as const;
      await manager.update(Take, { id: takeId }, failed);
    } else {
      await manager.delete(Reading, { takeId });
      await manager.insert(Reading, {
        takeId,
        engine: outcome.engine,
        document: JSON.stringify(outcome),
        sketch: presentSketch(outcome),
        findingCount: outcome.findings.length,
        readAt: at,
      });
      await manager.update(Take, { id: takeId }, { readingStatus: 'read', readingMessage: null, revision: seq });
    }
    return { change: { kind: 'take:read', payload: await aboutTake(recording, takeId) }, answer: undefined };
  });
}

/** Passes on what begins or ends a phase, and between those no more than eight a second. */
function throttled(tell: ReportProgress): ReportProgress {
  let last: AnalysisProgress | undefined;
  let at = 0;
  return (progress) => {
    const now = Date.now();
    if (progress.phase === last?.phase && progress.done < progress.total && now - at < PROGRESS_EVERY) return;
    last = progress;
    at = now;
    tell(progress);
  };
}
