import type { MessagePort } from 'node:worker_threads';
import type { AnalysisRequest, AnalysisResult } from '../../shared/finding/types.ts';
import type { PictureErrorCode } from './PictureError.ts';

/** What the pool hands to a worker. */
export interface AnalysisTask {
  request: AnalysisRequest;
  progress: MessagePort;
}

/** What a worker answers: errors cross a thread as plain values, because classes do not survive the copy. */
export type AnalysisAnswer =
  | { ok: true; result: AnalysisResult }
  | { ok: false; error: { file: string; code: PictureErrorCode; message: string } };
