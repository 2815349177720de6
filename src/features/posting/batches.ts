import { MAX_FRAMES, MAX_PICTURE_BYTES, MAX_PICTURES_PER_BATCH, type RefusedFile } from '../../../shared/api/drafts.ts';

/** A batch also ends here, so that a lost line never costs more than this. */
const MAX_BATCH_BYTES = 64 * 1024 * 1024;

const numeric = new Intl.Collator('en', { numeric: true });

/** The next files to send together: at most as many, and as many bytes, as one request should carry; at least one. */
export function nextBatch<F extends { size: number }>(queue: readonly F[]): F[] {
  const batch: F[] = [];
  let bytes = 0;
  for (const file of queue.slice(0, MAX_PICTURES_PER_BATCH)) {
    bytes += file.size;
    if (batch.length > 0 && bytes > MAX_BATCH_BYTES) break;
    batch.push(file);
  }
  return batch;
}

/** Sorts out what can be seen to be unusable before anything is sent, each with its reason; the rest in order of the names. */
export function sortOut<F extends { name: string; size: number }>(
  files: readonly F[],
  already: number,
): { usable: F[]; refused: RefusedFile[] } {
  const usable: F[] = [];
  const refused: RefusedFile[] = [];
  for (const file of files.toSorted((a, b) => numeric.compare(a.name, b.name))) {
    const reason = whyNot(file, already + usable.length);
    if (reason) refused.push({ name: file.name, reason });
    else usable.push(file);
  }
  return { usable, refused };
}

function whyNot(file: { name: string; size: number }, before: number): string | null {
  if (file.name.startsWith('.')) return 'It is a hidden file of the system, not a picture.';
  if (file.size === 0) return 'It is empty. Export this frame again.';
  if (file.size > MAX_PICTURE_BYTES) {
    return `It is ${Math.round(file.size / 1024 / 1024)} MB; a picture may have up to ${MAX_PICTURE_BYTES / 1024 / 1024} MB.`;
  }
  if (before >= MAX_FRAMES)
    return `A strip holds up to ${MAX_FRAMES.toLocaleString('en')} frames. Post the part with the flight.`;
  return null;
}
