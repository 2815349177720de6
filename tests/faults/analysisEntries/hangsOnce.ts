import type { AnalysisTask } from '../../../server/analysis/messages.ts';

/** A worker that says one word and then never lets go of its thread, unless it is asked for an answer. */
export async function analyse({ request, progress }: AnalysisTask): Promise<unknown> {
  if (request.framePaths[0] === 'hang') {
    progress.postMessage({ done: 1, total: 1, phase: 'decoding' });
    // The word leaves with the next turn of the loop; after it the thread is blocked for good.
    await new Promise((resolve) => setImmediate(resolve));
    for (;;) Math.random();
  }
  return { ok: true, result: { reading: {} } };
}
