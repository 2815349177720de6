import path from 'node:path';

/** Where the pictures of a post lie while it is put together. */
export function draftFolder(dataDir: string, draftId: string): string {
  return path.join(dataDir, 'drafts', draftId);
}

/** Where the frames of a take lie, for good. */
export function takeFolder(dataDir: string, takeId: string): string {
  return path.join(dataDir, 'takes', takeId);
}

/** Name of the thumbnail that belongs to a picture file of ours: `0001.png` has `0001.small.webp`. */
export function thumbnailName(file: string): string {
  return `${path.parse(file).name}.small.webp`;
}
