import { basename } from 'node:path';
import { Finder, type Found } from '../../shared/finding/finder.ts';
import type { AnalysisRequest, Picture, ReportProgress } from '../../shared/finding/types.ts';
import { decodePicture } from './decode.ts';
import { PictureError } from './PictureError.ts';

interface Size {
  width: number;
  height: number;
}

/** Pictures decoded ahead of the one being looked at: the decoder has its own threads, two keep them busy. */
const DECODE_AHEAD = 2;

/**
 * Finds what moves in frames on disk. Each frame is decoded once; only the few that the background needs are kept.
 * @param report told of every picture decoded and looked at
 * @param signal stops the work between two pictures
 * @throws PictureError when a frame is damaged or has another size than the first, or there is none
 */
export async function findInFrames(
  request: Pick<AnalysisRequest, 'framePaths' | 'camera' | 'object'>,
  report: ReportProgress,
  signal?: AbortSignal,
): Promise<Found & Size> {
  const { framePaths } = request;
  const total = framePaths.length;
  if (total === 0) throw new PictureError('', 'empty_file', 'There are no frames to read.');
  const first = await decodePicture(framePaths[0]);
  const size: Size = { width: first.width, height: first.height };
  const finder = new Finder({ ...size, frames: total, camera: request.camera, object: request.object });

  let decoded = 0;
  const decode = async (index: number): Promise<Picture> => {
    signal?.throwIfAborted();
    const picture = index === 0 ? first : await decodePicture(framePaths[index]);
    refuseOtherSize(framePaths, index, picture, size);
    report({ done: ++decoded, total, phase: 'decoding' });
    return picture;
  };

  const samples = new Map<number, Picture>();
  for await (const { index, picture } of inOrder(finder.sampleIndices, decode)) samples.set(index, picture);
  finder.learn(finder.sampleIndices.map((index) => samples.get(index) as Picture));

  let looked = 0;
  const look = (index: number, picture: Picture): void => {
    signal?.throwIfAborted();
    finder.look(index, picture);
    report({ done: ++looked, total, phase: 'finding' });
  };
  for (const [index, picture] of samples) look(index, picture);
  const others = framePaths.map((_, index) => index).filter((index) => !samples.has(index));
  for await (const { index, picture } of inOrder(others, decode)) look(index, picture);
  return { ...finder.finish(), ...size };
}

/** Decodes a few pictures ahead and hands them out in order. */
async function* inOrder(
  indices: number[],
  decode: (index: number) => Promise<Picture>,
): AsyncGenerator<{ index: number; picture: Picture }> {
  const ahead: Promise<Picture>[] = [];
  let next = 0;
  const start = (): void => {
    if (next >= indices.length) return;
    const pending = decode(indices[next++]);
    // A failure is thrown where the picture is awaited; until then it must not count as unhandled.
    pending.catch(() => undefined);
    ahead.push(pending);
  };
  for (let k = 0; k < DECODE_AHEAD; k++) start();
  for (const index of indices) {
    const picture = await (ahead.shift() as Promise<Picture>);
    start();
    yield { index, picture };
  }
}

function refuseOtherSize(paths: string[], index: number, picture: Picture, size: Size): void {
  if (picture.width === size.width && picture.height === size.height) return;
  const name = basename(paths[index]);
  const here = `${picture.width} × ${picture.height} px`;
  const wanted = `“${basename(paths[0])}” is ${size.width} × ${size.height} px`;
  throw new PictureError(
    name,
    'size_differs',
    `“${name}” is ${here} but ${wanted}; all frames of a take need one size.`,
  );
}
