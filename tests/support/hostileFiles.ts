import { execFile } from 'node:child_process';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { promisify } from 'node:util';
import sharp from 'sharp';
import { blankPng } from './pngBytes.ts';

const run = promisify(execFile);

/** A file or folder that must be refused, and what its sentence says. */
export interface HostileFile {
  name: string;
  path: string;
  says: string;
}

/**
 * Writes the corpus of files that a reader of pictures has to refuse: bombs, stubs, lies about what they are, and files
 * that name others. Everything is made here; nothing is fetched.
 */
export async function writeHostileFiles(folder: string): Promise<HostileFile[]> {
  const files: HostileFile[] = [];
  const add = async (name: string, bytes: Buffer | string, says: string): Promise<void> => {
    const path = join(folder, name);
    await writeFile(path, bytes);
    files.push({ name, path, says });
  };
  const frame = await sharp({ create: { width: 64, height: 48, channels: 3, background: '#c84' } })
    .png()
    .toBuffer();

  await add('text.png', 'not a picture\n', 'is a text file');
  await add('empty.png', '', 'is empty');
  await add('bomb.png', blankPng(30_000, 30_000), '30,000 × 30,000 px');
  await add('edge.png', blankPng(60_000, 8), '60,000 × 8 px');
  await add('cut.png', frame.subarray(0, Math.floor(frame.length * 0.6)), 'cut off or damaged');
  await add('head.jpg', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16]), 'damaged');
  await add('riff.webp', Buffer.from('RIFF\x10\0\0\0WEBPVP8 ', 'latin1'), 'damaged');
  await add('page.svg.png', '<svg xmlns="http://www.w3.org/2000/svg"><image href="/etc/passwd"/></svg>', 'post PNG');
  await add('one-pixel.png', blankPng(1, 1), 'at least 8 px');
  await add('playlist.mp4', '#EXTM3U\n#EXTINF:10,\nfile:///etc/passwd\n#EXT-X-ENDLIST\n', 'no video that can be read');
  await add('concat.mp4', "ffconcat version 1.0\nfile '/etc/passwd'\n", 'no video that can be read');
  await add('noise.mp4', Buffer.alloc(4096, 'abcd'), 'no video that can be read');
  await add('noise.gif', Buffer.concat([Buffer.from('GIF89a'), Buffer.alloc(64, 7)]), 'cut off or damaged');
  await add('wrong.csv', 'time,px\n1,2\n', 'time, px');
  await add('nan.csv', 'frame,x,y\n1,NaN,3\n', 'NaN');
  await add('twice.csv', 'frame,x,y\n1,2,3\n1,2,3\n', 'second mark');
  await add('million.csv', '1,2,3\n'.repeat(1_000_000), 'the most is 100,000');
  await add('script.csv', '<script>alert(1)</script>\n', 'columns');

  await subtitlesOnly(folder, files);
  await videoPlaylist(folder, files);
  await oddFolders(folder, files, frame);
  return files;
}

/** A video file that holds subtitles and no picture. */
async function subtitlesOnly(folder: string, files: HostileFile[]): Promise<void> {
  const source = join(folder, 'words.srt');
  await writeFile(source, '1\n00:00:00,000 --> 00:00:02,000\nhello\n');
  const path = join(folder, 'subtitles.mkv');
  await run('ffmpeg', ['-nostdin', '-v', 'error', '-y', '-i', source, '-c:s', 'srt', path]);
  files.push({ name: 'subtitles.mkv', path, says: 'has no pictures' });
}

/** A playlist called .mp4 that names a real video beside it: a white list of protocols alone would open it. */
async function videoPlaylist(folder: string, files: HostileFile[]): Promise<void> {
  const secret = join(folder, 'secret.mp4');
  const source = ['-f', 'lavfi', '-i', 'testsrc=size=64x48:rate=24:duration=1'];
  await run('ffmpeg', ['-nostdin', '-v', 'error', '-y', ...source, '-pix_fmt', 'yuv420p', secret]);
  const path = join(folder, 'borrowed.mp4');
  await writeFile(path, `#EXTM3U\n#EXT-X-TARGETDURATION:1\n#EXTINF:1,\nfile://${secret}\n#EXT-X-ENDLIST\n`);
  files.push({ name: 'borrowed.mp4', path, says: 'no video that can be read' });
  const cut = join(folder, 'cut.mp4');
  await writeFile(cut, (await readFile(secret)).subarray(0, 600));
  files.push({ name: 'cut.mp4', path: cut, says: 'no video that can be read' });
}

async function oddFolders(folder: string, files: HostileFile[], frame: Buffer): Promise<void> {
  const make = async (name: string, contents: Record<string, Buffer | string>, says: string): Promise<void> => {
    const path = join(folder, name);
    await mkdir(path);
    for (const [file, bytes] of Object.entries(contents)) await writeFile(join(path, file), bytes);
    files.push({ name, path, says });
  };
  const larger = await sharp({ create: { width: 80, height: 48, channels: 3, background: '#c84' } })
    .png()
    .toBuffer();
  await make('nothing', {}, 'is empty');
  await make('no-pictures', { 'notes.txt': 'hello' }, 'holds no PNG');
  await make('two-sizes', { 'f_1.png': frame, 'f_2.png': larger }, '“f_2.png” is 80 × 48 px');
  await make('one-bad', { 'f_1.png': frame, 'f_2.png': 'no', 'f_3.png': frame }, '“f_2.png” is a text file');
}
