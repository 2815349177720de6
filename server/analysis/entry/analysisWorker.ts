import { analyseFrames } from '../analyseFrames.ts';
import type { AnalysisAnswer, AnalysisTask } from '../messages.ts';
import { PictureError } from '../PictureError.ts';

/** Runs in a worker thread: one analysis a call, progress through the port it was given. */
export async function analyse(task: AnalysisTask): Promise<AnalysisAnswer> {
  try {
    const result = await analyseFrames(task.request, (progress) => task.progress.postMessage(progress));
    return { ok: true, result };
  } catch (cause) {
    if (!(cause instanceof PictureError)) throw cause;
    return { ok: false, error: { file: cause.file, code: cause.code, message: cause.message } };
  }
}
