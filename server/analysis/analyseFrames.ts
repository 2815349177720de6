import { ontoPictures, ontoStage } from '../../shared/finding/cameraMove.ts';
import type { AnalysisRequest, AnalysisResult, ReportProgress } from '../../shared/finding/types.ts';
import { readMotion } from '../../shared/motion/read.ts';
import type { Reading, ReadObject } from '../../shared/reading/document.ts';
import { atTheirFrames } from './atTheirFrames.ts';
import { findInFrames } from './findInFrames.ts';

/**
 * Reads a take from its frames on disk in the current thread: decodes, finds what moves, reads the motion.
 * @param report told of every picture decoded and looked at
 * @param signal stops the work between two pictures
 * @throws PictureError when a frame is damaged or has another size than the first
 */
export async function analyseFrames(
  request: AnalysisRequest,
  report: ReportProgress,
  signal?: AbortSignal,
): Promise<AnalysisResult> {
  const total = request.framePaths.length;
  const found = await findInFrames(request, report, signal);
  const onStage = found.tracks.map((track) => ({ ...track, marks: ontoStage(track.marks, found.camera) }));
  const { frameNumbers } = request;
  const staged = { ...found, tracks: onStage };
  const { tracks, camera, cautions, width, height } = frameNumbers ? atTheirFrames(staged, frameNumbers) : staged;
  const frames = frameNumbers?.at(-1) ?? total;
  report({ done: 0, total, phase: 'reading' });
  const { id, kind, firstFrame, fps, hold, scale, gravity, tolerances } = request;
  const reading = readMotion(
    { id, kind, frames, width, height, firstFrame, fps, hold, scale, gravity, camera, tracks, cautions },
    { tolerances },
  );
  report({ done: total, total, phase: 'reading' });
  return { reading: tracks.length === 0 ? withoutMotion(reading) : ontoPictures(reading) };
}

/** Nothing moved: the reading says so in its one object, and why in its cautions. */
function withoutMotion(reading: Reading): Reading {
  const nothing: ReadObject = {
    id: 'A',
    what: 'thing',
    outcome: 'no-motion',
    points: [],
    marks: [],
    contacts: [],
    flights: [],
  };
  return { ...reading, objects: [nothing] };
}
