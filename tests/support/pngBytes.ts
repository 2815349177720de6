import { crc32, deflateSync } from 'node:zlib';

/** One chunk of a PNG with its length and checksum (PNG, third edition, 5.3). */
export function pngChunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(data.length, 0);
  frame.writeUInt32BE(crc32(body), 4);
  return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)]);
}

/** A whole black PNG of any size at one bit a pixel: large pictures in few bytes, as a decompression bomb has them. */
export function blankPng(width: number, height: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header[8] = 1;
  const rows = deflateSync(Buffer.alloc(height * (1 + Math.ceil(width / 8))), { level: 1 });
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  const nothing = Buffer.alloc(0);
  return Buffer.concat([signature, pngChunk('IHDR', header), pngChunk('IDAT', rows), pngChunk('IEND', nothing)]);
}
