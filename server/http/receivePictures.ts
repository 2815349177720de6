import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import multer from 'multer';
import { MAX_PICTURE_BYTES, MAX_PICTURES_PER_BATCH } from '../../shared/api/drafts.ts';
import { AppError, codeOf } from '../errors.ts';
import type { ArrivedFile } from '../services/draftPictures.service.ts';

/** Writes the pictures of a multipart request into a folder. A file that is too large is cut off and counted on. */
export async function receivePictures(
  req: Request,
  res: Response,
  { field, folder }: { field: string; folder: string },
): Promise<ArrivedFile[]> {
  const upload = multer({
    storage: storeIn(folder),
    limits: { files: MAX_PICTURES_PER_BATCH, fields: 0, parts: MAX_PICTURES_PER_BATCH + 1, fieldNameSize: 100 },
  });
  await new Promise<void>((resolve, reject) => {
    void upload.array(field)(req, res, (error: unknown) => (error ? reject(asRefusal(error)) : resolve()));
  });
  const files = (req.files ?? []) as Express.Multer.File[];
  return files.map((file) => ({ path: file.path, name: nameOf(file.originalname), bytes: file.size }));
}

/** The parser throws plain errors for what it cannot parse; those of the disk have a code and are no refusal. */
function asRefusal(error: unknown): unknown {
  if (error instanceof multer.MulterError || codeOf(error) !== '') return error;
  return new AppError('invalid_request', 'The pictures did not arrive as they should; send them again.', {
    status: 400,
    cause: error,
  });
}

/**
 * Disk storage that goes on when a file is too large: one wrong file must not cost the others of the batch, which
 * multer's own limit would.
 */
function storeIn(folder: string): multer.StorageEngine {
  return {
    _handleFile(_req, file, done) {
      const target = path.join(folder, `in-${randomUUID()}`);
      let size = 0;
      const upToTheLimit = new Transform({
        transform(chunk: Buffer, _encoding, next) {
          size += chunk.length;
          next(null, size > MAX_PICTURE_BYTES ? undefined : chunk);
        },
      });
      pipeline(file.stream, upToTheLimit, createWriteStream(target, { mode: 0o600 })).then(
        () => done(null, { path: target, size }),
        (error: unknown) => {
          rm(target, { force: true }).finally(() => done(error));
        },
      );
    },
    _removeFile(_req, file, done) {
      rm(file.path, { force: true }).then(() => done(null), done);
    },
  };
}

/** multer hands names over as latin1; browsers send UTF-8. Only the last part counts, and no control characters. */
function nameOf(originalName: string): string {
  const name = Buffer.from(originalName, 'latin1').toString('utf8').normalize('NFC');
  const last = name
    .split(/[/\\]/)
    .at(-1)!
    .replaceAll(/\p{Cc}/gu, '')
    .trim();
  return [...last].slice(0, 255).join('') || 'picture without a name';
}
