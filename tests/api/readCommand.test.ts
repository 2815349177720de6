import { spawn } from 'node:child_process';
import { mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readingSchema } from '../../shared/reading/document.ts';
import { mountStrip } from '../unit/finding/mountStrip.ts';
import { paintTake, toss } from '../support/paintTake.ts';
import { drawTake } from '../support/drawTake.ts';

const ROOT = join(import.meta.dirname, '../..');
let folder: string;
const at = (name: string): string => join(folder, name);

interface Outcome {
  code: number | null;
  out: string;
  err: string;
}

function read(args: string[], input = ''): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/scripts/read.ts', ...args], { cwd: ROOT });
    let out = '';
    let err = '';
    child.stdout.on('data', (data) => {
      out += data;
    });
    child.stderr.on('data', (data) => {
      err += data;
    });
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, out, err }));
    child.stdin.end(input);
  });
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'spandrel-read-test-'));
  await mkdir(at('take'));
  await drawTake(at('take'), { frames: 16 });
}, 60_000);
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('the read command', { timeout: 120_000 }, () => {
  it('reads a folder of frames to a document', async () => {
    const { code, out, err } = await read([at('take'), '--json', '--first-frame', '1001', '--fps', '24000/1001']);
    expect(err).toBe('');
    expect(code).toBe(0);
    const reading = readingSchema.parse(JSON.parse(out));
    expect(reading.source).toMatchObject({ frames: 16, firstFrame: 1001, fps: { num: 24_000, den: 1001 } });
    expect(reading.objects[0].marks).toHaveLength(16);
  });

  it('says it in plain words, in the production’s frames, and draws it on the frames', async () => {
    const { code, out } = await read([at('take'), '--first-frame', '1001', '--overlay', at('drawn')]);
    expect(code).toBe(0);
    expect(out).toContain('Frames 1001–1016 at 24 a second, on ones, 320 × 200 px.');
    expect(out).toContain('A: 16 marks from frame 1001 to 1016.');
    expect((await readdir(at('drawn'))).toSorted()).toHaveLength(16);
    const [plain, drawn] = await Promise.all(
      [at('take/f_0008.png'), at('drawn/1008.png')].map((path) => sharp(path).removeAlpha().raw().toBuffer()),
    );
    expect(Buffer.compare(plain, drawn)).not.toBe(0);
  });

  it('finds the frames in a strip picture, and takes a grid that is given', async () => {
    const { picture } = mountStrip({ columns: 10, rows: 1, gutter: 6, margin: 6, ground: 20 });
    const raw = { width: picture.width, height: picture.height, channels: 3 as const };
    await sharp(picture.data, { raw }).png().toFile(at('strip.png'));
    for (const grid of [[], ['--grid', '10x1']]) {
      const { code, out } = await read([at('strip.png'), '--json', ...grid]);
      expect(code).toBe(0);
      expect(JSON.parse(out).source).toMatchObject({ kind: 'strip', frames: 10, width: 96, height: 64 });
    }
  });

  it('takes an animation apart, and a picture that shows longer counts as several frames', async () => {
    const { pictures } = paintTake({ frames: 12 });
    const stack = Buffer.concat(pictures.map((picture) => picture.data));
    const raw = { width: 320, height: 200 * 12, channels: 3 as const, pageHeight: 200 };
    const delay = pictures.map((_, k) => (k === 3 ? 80 : 40));
    for (const name of ['toss.gif', 'toss.webp']) {
      await sharp(stack, { raw })
        .toFormat(name.endsWith('gif') ? 'gif' : 'webp', { delay })
        .toFile(at(name));
      const { code, out, err } = await read([at(name), '--json']);
      expect(err, name).toBe('');
      expect(code, name).toBe(0);
      expect(JSON.parse(out).source, name).toMatchObject({ kind: 'animation', frames: 13, fps: { num: 25, den: 1 } });
    }
  });

  it('reads a CSV whose rows carry the production’s numbers', async () => {
    const rows = Array.from({ length: 16 }, (_, k) => `${1001 + k},${toss(k).x},${toss(k).y}`);
    await writeFile(at('marks.csv'), ['frame,x,y', ...rows].join('\n'));
    const { code, out } = await read([at('marks.csv'), '--json', '--out', at('reading.json')]);
    expect([code, out]).toEqual([0, '']);
    const reading = readingSchema.parse(JSON.parse(await readFile(at('reading.json'), 'utf8')));
    expect(reading.source).toMatchObject({ kind: 'marks', firstFrame: 1001, frames: 16 });
    expect(reading.objects[0].flights[0].gravity.value).toBeCloseTo(2, 1);
  });

  it('answers JSON lines with one reading a line, in their order', async () => {
    const marks = Array.from({ length: 14 }, (_, k) => ({ frame: k + 1, ...toss(k) }));
    const lines = ['b', 'a', 'c'].map((id) => JSON.stringify({ id, fps: 24, marks }));
    const { code, out } = await read(['-', '--json'], `${lines.join('\n')}\n`);
    expect(code).toBe(0);
    expect(
      out
        .trimEnd()
        .split('\n')
        .map((line) => JSON.parse(line).id),
    ).toEqual(['b', 'a', 'c']);
  });

  it('says that nothing moves and does not fail', async () => {
    await mkdir(at('still'));
    await drawTake(at('still'), { frames: 8, discs: [() => ({ x: 90, y: 90 })] });
    const { code, out } = await read([at('still'), '--json']);
    expect(code).toBe(0);
    const reading = readingSchema.parse(JSON.parse(out));
    expect(reading.objects[0].outcome).toBe('no-motion');
    expect(reading.cautions[0]).toContain('Nothing moves');
  });

  it.each([
    ['a path that is not there', ['/not/there'], 'is not there'],
    ['no input', [], 'Give one input.'],
    ['an option that is not there', ['x', '--loud'], '--loud'],
    ['a frame rate that is none', ['x', '--fps', 'fast'], '--fps fast is no frame rate'],
    ['a place that is none', ['x', '--object', 'left'], '--object left is no place'],
  ])('exits 2 with a sentence for %s', async (_, args, part) => {
    const { code, out, err } = await read(args);
    expect([code, out]).toEqual([2, '']);
    expect(err).toContain(part);
  });

  it('exits 2 and names the line that is no track', async () => {
    const { code, err } = await read(['-', '--json'], '{"marks":[]}\n{"marks":"none"}\n');
    expect(code).toBe(2);
    expect(err).toContain('Line 2 is no track');
  });
});
