import { existsSync, readFileSync } from 'node:fs';
import { Matrix, QrDecomposition } from 'ml-matrix';
import { fitQuadratic } from '../../../shared/motion/parabola.ts';
import { readMotion } from '../../../shared/motion/read.ts';
import type { Mark } from '../../../shared/reading/document.ts';

interface TrackLine {
  id: string;
  fps: number;
  hold: 1 | 2 | 3;
  width: number;
  height: number;
  marks: Mark[];
}

const TRACKS = new URL('../../../../shared/footage/open/tracks-input.jsonl', import.meta.url);

/** Tracks of the shelf where they are there, else throws and bounces of our own, so that every clone can measure. */
function tracks(): TrackLine[] {
  if (existsSync(TRACKS)) {
    return readFileSync(TRACKS, 'utf8')
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as TrackLine);
  }
  return Array.from({ length: 200 }, (_, k) => ({
    id: `own-${k}`,
    fps: 24,
    hold: 1 as const,
    width: 960,
    height: 540,
    marks: bounces(20 + (k % 9), 10 + (k % 7), 0.3, k),
  }));
}

/** A row of bounces with a little noise: `count` marks, every flight `length` frames. */
function bounces(count: number, length: number, noise: number, seed: number): Mark[] {
  let state = seed * 2654435761 + 1;
  const random = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296 - 0.5;
  };
  return Array.from({ length: count }, (_, i) => {
    const u = (i + 0.3) % length;
    return {
      frame: i + 1,
      x: 50 + 4 * i + noise * random(),
      y: 400 + 2 * u * (u - length) + noise * random(),
      origin: 'import' as const,
    };
  });
}

function read(track: TrackLine): void {
  readMotion({
    id: track.id,
    kind: 'marks',
    frames: track.marks[track.marks.length - 1]!.frame,
    width: track.width,
    height: track.height,
    firstFrame: 1,
    fps: { num: Math.round(track.fps * 1000), den: 1000 },
    hold: track.hold,
    tracks: [{ id: 'A', marks: track.marks }],
  });
}

/** Processor time of a number of calls, microseconds a call: what others do on the machine meanwhile hardly counts. */
function costOf(run: () => void, times: number): number {
  const before = process.cpuUsage();
  for (let i = 0; i < times; i += 1) run();
  return process.cpuUsage(before).user / times;
}

/** Costs of several things, measured in turns so that a slow moment of the machine falls on all of them; the least of each. */
function inTurns(runs: { run: () => void; times: number }[], turns: number): number[] {
  const least = runs.map(() => Infinity);
  for (let turn = 0; turn < turns; turn += 1) {
    runs.forEach(({ run, times }, k) => {
      least[k] = Math.min(least[k]!, costOf(run, times));
    });
  }
  return least;
}

/**
 * The cost of a full reading against one bare quadratic least-squares fit of 24 marks by ml-matrix QR, of our own bare fit
 * against the same, and how the cost grows with the number of marks.
 */
export function benchReading(): void {
  const t = Array.from({ length: 24 }, (_, i) => i);
  const y = t.map((k) => 100 + 3 * k - 0.2 * k * k + 0.3 * Math.sin(7 * k));
  const column = Matrix.columnVector(y);
  const bare = () => {
    new QrDecomposition(new Matrix(t.map((k) => [1, k, k * k]))).solve(column);
  };
  const own = () => {
    fitQuadratic(t, y);
  };
  const some = tracks().filter((track) => track.marks.length >= 20 && track.marks.length <= 28);
  const all = () => some.forEach(read);
  const [qr = 1, ours = 1, whole = 1] = inTurns(
    [
      { run: bare, times: 30_000 },
      { run: own, times: 300_000 },
      { run: all, times: 1 },
    ],
    5,
  );
  const reading = whole / some.length;
  const print = (line: string) => process.stdout.write(`${line}\n`);
  print(`bare quadratic fit of 24 marks, ml-matrix QR   ${qr.toFixed(2)} µs`);
  print(
    `our own bare fit                               ${ours.toFixed(2)} µs   ${(ours / qr).toFixed(3)} ×  (at most 0.5 ×)`,
  );
  print(
    `mean full reading of ${some.length} tracks, 20 to 28 marks  ${reading.toFixed(0)} µs   ${(reading / qr).toFixed(0)} ×  (goal 150 ×, floor 300 ×)`,
  );
  const sizes = [50, 100, 200, 500, 1000, 2000];
  const costs = sizes.map((count) => {
    const track = { id: 'long', fps: 24, hold: 1 as const, width: 0, height: 0, marks: bounces(count, 16, 0.3, 5) };
    read(track);
    return inTurns([{ run: () => read(track), times: count > 500 ? 2 : 10 }], 4)[0]!;
  });
  sizes.forEach((count, i) => {
    const growth = costs[i]! / costs[0]! / (count / sizes[0]!);
    print(`${String(count).padStart(5)} marks  ${(costs[i]! / 1000).toFixed(2)} ms   ${growth.toFixed(2)} × linear`);
  });
  print('At most 1.5 × linear from 50 to 2000 marks; 100 marks at most 16 ms.');
}
