import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import { type Reading, shownFrame } from '../../../shared/reading/document.ts';

const TRUE_ARC = '#1f5fd6';
const OFF = '#d3322a';
const MARK = '#14181c';

/**
 * Writes every frame as PNG with its layers drawn on: the marks so far, the true arc, and what is off with where it
 * should be. Blue is where it should be, red is what is off.
 * @returns the files written, named by the production's frame numbers
 */
export async function writeOverlays(reading: Reading, framePaths: string[], folder: string): Promise<string[]> {
  await mkdir(folder, { recursive: true });
  const written: string[] = [];
  for (const [index, framePath] of framePaths.entries()) {
    const number = shownFrame(index + 1, reading.source.firstFrame);
    const path = join(folder, `${String(number).padStart(4, '0')}.png`);
    const svg = Buffer.from(layersOf(reading, index + 1));
    await sharp(framePath)
      .autoOrient()
      .composite([{ input: svg }])
      .png()
      .toFile(path);
    written.push(path);
  }
  return written;
}

function layersOf(reading: Reading, frame: number): string {
  const { width, height } = reading.source;
  const line = Math.max(1, Math.round(width / 480));
  const shapes: string[] = [];
  for (const object of reading.objects) {
    for (const flight of object.flights) {
      const points = flight.trueArc.map((point) => `${point.x.toFixed(1)},${point.y.toFixed(1)}`).join(' ');
      shapes.push(`<polyline points="${points}" fill="none" stroke="${TRUE_ARC}" stroke-width="${line}"/>`);
    }
    for (const mark of object.marks) {
      const here = mark.frame === frame;
      const radius = here ? 3 * line : 1.5 * line;
      const look = here ? `fill="none" stroke="${MARK}" stroke-width="${line}"` : `fill="${MARK}" fill-opacity="0.6"`;
      shapes.push(`<circle cx="${mark.x}" cy="${mark.y}" r="${radius}" ${look}/>`);
    }
  }
  for (const finding of reading.findings) {
    const object = reading.objects.find(({ id }) => id === finding.object);
    const mark = object?.marks.find((candidate) => candidate.frame === frame);
    if (!mark || frame < finding.fromFrame || frame > finding.toFrame) continue;
    shapes.push(
      `<circle cx="${mark.x}" cy="${mark.y}" r="${5 * line}" fill="none" stroke="${OFF}" stroke-width="${line}"/>`,
    );
    const move = finding.mend.find((step) => step.frame === frame);
    if (!move) continue;
    const [x, y] = [mark.x + move.dx, mark.y + move.dy];
    shapes.push(
      `<path d="M${mark.x} ${mark.y}L${x} ${y}" stroke="${TRUE_ARC}" stroke-width="${line}"/>`,
      `<circle cx="${x}" cy="${y}" r="${2.5 * line}" fill="${TRUE_ARC}"/>`,
    );
  }
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}">${shapes.join('')}</svg>`;
}
