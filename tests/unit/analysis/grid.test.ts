import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findGrid, splitStrip } from '../../../server/analysis/grid.ts';
import { detectGrid } from '../../../shared/finding/detectGrid.ts';
import { evenGrid, type Grid } from '../../../shared/finding/grid.ts';
import { mountStrip, type MountOptions } from '../finding/mountStrip.ts';
import { decodePicture } from '../../../server/analysis/decode.ts';

const SEQUENCES = join(import.meta.dirname, '../../../../shared/footage/open/sequences');
const strips = existsSync(SEQUENCES)
  ? readdirSync(SEQUENCES).flatMap((id) =>
      readdirSync(join(SEQUENCES, id))
        .filter((name) => /^contact-.*\.png$/.test(name))
        .map((name) => join(id, name)),
    )
  : [];

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'spandrel-grid-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('the grid of a strip picture', () => {
  const cases: [string, Partial<MountOptions>][] = [
    ['a row between dark gutters', { columns: 9, rows: 1, gutter: 6, margin: 6, ground: 24 }],
    ['a row between light gutters', { columns: 12, rows: 1, gutter: 4, margin: 10, ground: 245 }],
    ['a column between light gutters', { columns: 1, rows: 8, gutter: 5, margin: 5, ground: 250 }],
    [
      'a grid with unequal gutters and empty cells at its end',
      { columns: 4, rows: 3, gutter: 8, gutterY: 14, margin: 3, ground: 30, frames: 10 },
    ],
    ['a row with gutters and no margin', { columns: 7, rows: 1, gutter: 3, margin: 0, ground: 0 }],
    ['a row edge to edge', { columns: 10, rows: 1, gutter: 0, margin: 0 }],
    ['a column edge to edge', { columns: 1, rows: 9, gutter: 0, margin: 0 }],
    ['a grid edge to edge', { columns: 5, rows: 4, gutter: 0, margin: 0 }],
    ['a grid with a burn-in in its margin', { columns: 5, rows: 4, gutter: 6, margin: 24, ground: 20, label: true }],
  ];
  it.each(cases)('is found in %s', (_, options) => {
    const { picture, grid } = mountStrip(options);
    const { confidence, ...found } = detectGrid(picture);
    expect(found).toEqual(grid);
    expect(confidence).toBeGreaterThan(0.3);
  });

  it('is one frame, without confidence, where nothing repeats', () => {
    const { picture } = mountStrip({ columns: 1, rows: 1, gutter: 0, margin: 0 });
    expect(detectGrid(picture)).toMatchObject({ columns: 1, rows: 1, count: 1, confidence: 0, cellWidth: 96 });
  });

  it.skipIf(strips.length === 0).each(strips)('is the one that footage says: %s', async (strip) => {
    const truth = JSON.parse(readFileSync(join(SEQUENCES, strip.replace('.png', '.json')), 'utf8'));
    await expect(findGrid(join(SEQUENCES, strip))).resolves.toMatchObject({
      columns: truth.columns,
      rows: truth.rows,
      cellWidth: truth.cell[0],
      cellHeight: truth.cell[1],
      marginX: truth.gutter,
      marginY: truth.gutter,
      gutterX: truth.columns > 1 ? truth.gutter : 0,
      gutterY: truth.rows > 1 ? truth.gutter : 0,
      count: truth.frame_indices.length,
    });
  });
});

describe('splitting a strip', () => {
  it('writes every frame as it was, in reading order', async () => {
    const { picture, grid, cells } = mountStrip({ columns: 3, rows: 2, gutter: 5, margin: 7, ground: 20, frames: 5 });
    const path = join(folder, 'strip.png');
    await sharp(picture.data, { raw: { width: picture.width, height: picture.height, channels: 3 } })
      .png()
      .toFile(path);
    const frames = await splitStrip(path, grid, join(folder, 'cells'));
    expect(frames.map(({ width, height }) => [width, height])).toEqual(cells.map(() => [96, 64]));
    for (const [index, frame] of frames.entries()) {
      expect(Buffer.compare((await decodePicture(frame.path)).data, cells[index].data), `frame ${index + 1}`).toBe(0);
    }
  });

  it('refuses a grid that reaches past the edge', async () => {
    const grid: Grid = { ...evenGrid(300, 200, 3, 2), cellWidth: 200 };
    await expect(splitStrip(join(folder, 'strip.png'), grid, folder)).rejects.toMatchObject({ code: 'no_grid' });
  });
});
