import { readdir } from 'node:fs/promises';
import { basename, join, resolve } from 'node:path';
import { z } from 'zod';
import { unfoldDurations } from '../../../shared/finding/durations.ts';
import type { FrameRate } from '../../../shared/reading/document.ts';
import { PictureError } from '../PictureError.ts';
import { MAX_EDGE } from '../pictureLimits.ts';
import { tooLong } from './pages.ts';
import { runTool, ToolError } from './runTool.ts';
import { MOST_FRAMES, repeatPaths, type UnfoldedFrames } from './UnfoldedFrames.ts';

/** Containers that may be opened. A playlist that is called .mp4 names other files, so a white list of names is not enough. */
const CONTAINERS = { video: 'mov,mp4,m4a,3gp,3g2,mj2,matroska,webm', animation: 'apng' };
/** Pixels of a video's picture above which it is refused: 8K. */
const MAX_VIDEO_PIXELS = 7680 * 4320;
const LONGEST_SECONDS = 300;

const probeSchema = z.object({
  streams: z.array(
    z.object({
      width: z.number().optional(),
      height: z.number().optional(),
      r_frame_rate: z.string(),
      avg_frame_rate: z.string(),
    }),
  ),
  format: z.object({ duration: z.string().optional() }).optional(),
});

const timesSchema = z.object({
  frames: z.array(z.object({ best_effort_timestamp_time: z.string().optional() })),
});

/**
 * Takes a video (MP4, MOV, WebM) or an APNG apart into one PNG a picture: upright, and where its frame rate varies each
 * picture shown as many frames as its time says.
 * @throws PictureError when it is no video, is damaged, too large or too long, or ffmpeg is not installed
 */
export async function unfoldVideo(
  path: string,
  originalName: string,
  outDir: string,
  kind: 'video' | 'animation' = 'video',
): Promise<UnfoldedFrames> {
  const name = originalName || basename(path);
  const safe = ['-protocol_whitelist', 'file', '-format_whitelist', CONTAINERS[kind]];
  const input = [...safe, '-max_pixels', String(MAX_VIDEO_PIXELS), '-i', `file:${resolve(path)}`];
  try {
    const fields = 'stream=width,height,r_frame_rate,avg_frame_rate:format=duration';
    const select = ['-v', 'error', '-select_streams', 'v:0', '-of', 'json'];
    const probe = probeSchema.parse(
      JSON.parse(await runTool('ffprobe', [...select, '-show_entries', fields, ...input])),
    );
    const stream = probe.streams[0];
    if (!stream) throw new PictureError(name, 'not_a_picture', `“${name}” has no pictures in it.`);
    if (Math.max(stream.width ?? 0, stream.height ?? 0) > MAX_EDGE) throw tooLarge(name);
    if (Number(probe.format?.duration ?? 0) > LONGEST_SECONDS) throw tooLong(name);
    const target = join(outDir, 'frame-%05d.png');
    const only = [
      '-map',
      '0:v:0',
      '-an',
      '-sn',
      '-dn',
      '-fps_mode',
      'passthrough',
      '-frames:v',
      String(MOST_FRAMES + 1),
    ];
    const write = ['-f', 'image2', '-c:v', 'png', '-compression_level', '1', target];
    await runTool('ffmpeg', ['-nostdin', '-v', 'error', ...input, ...only, ...write]);
    const names = (await readdir(outDir)).filter((file) => file.startsWith('frame-')).toSorted();
    if (names.length === 0) throw new PictureError(name, 'damaged_picture', `“${name}” shows no picture.`);
    if (names.length > MOST_FRAMES) throw tooLong(name);
    const paths = names.map((file) => join(outDir, file));
    const average = rateOf(stream.avg_frame_rate);
    if (average && stream.avg_frame_rate === stream.r_frame_rate && kind === 'video') {
      return { kind, framePaths: paths, fps: average, cautions: [] };
    }
    const times = await runTool('ffprobe', [...select, '-show_entries', 'frame=best_effort_timestamp_time', ...input]);
    return { kind, ...unfoldTimes(timesSchema.parse(JSON.parse(times)), paths, kind) };
  } catch (cause) {
    throw explain(cause, name);
  }
}

function unfoldTimes(times: z.infer<typeof timesSchema>, paths: string[], kind: 'video' | 'animation') {
  const stamps = times.frames.map((frame) => Number(frame.best_effort_timestamp_time));
  const durations = stamps.slice(1).map((stamp, k) => 1000 * (stamp - stamps[k]));
  const usual = durations.toSorted((a, b) => a - b)[durations.length >> 1] ?? 0;
  const { repeats, fps } = unfoldDurations([...durations, usual]);
  const uneven = repeats.some((repeat) => repeat > 1);
  const caution = 'The frame rate varies in this video; pictures that show for longer count as several frames.';
  return { framePaths: repeatPaths(paths, repeats), fps, cautions: uneven && kind === 'video' ? [caution] : [] };
}

function rateOf(text: string): FrameRate | null {
  const [num, den] = text.split('/').map(Number);
  return Number.isInteger(num) && Number.isInteger(den) && num > 0 && den > 0 ? { num, den } : null;
}

function tooLarge(name: string): PictureError {
  return new PictureError(name, 'picture_too_large', `“${name}” is larger than 7680 × 4320 px; give a smaller video.`);
}

function explain(cause: unknown, name: string): unknown {
  if (cause instanceof PictureError) return cause;
  if (cause instanceof ToolError && cause.reason === 'missing') {
    const sentence = 'Videos need ffmpeg, which is not installed here; run apt-get install ffmpeg, or give frames.';
    return new PictureError(name, 'unsupported_format', sentence);
  }
  if (cause instanceof ToolError && cause.reason === 'timeout') {
    return new PictureError(name, 'picture_too_large', `“${name}” took too long to open; give a shorter part of it.`);
  }
  const sentence = `“${name}” is no video that can be read, or it is damaged; give MP4, MOV, WebM or frames.`;
  return new PictureError(name, 'not_a_picture', sentence);
}
