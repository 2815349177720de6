import { sayNumbers, byName, readFrameNumbers } from '../../shared/frames/frameNumbers.ts';
import type { RefusedFile } from '../../shared/api/drafts.ts';
import type { Draft } from '../entities/Draft.ts';
import type { DraftPicture } from '../entities/DraftPicture.ts';
import type { DraftParts } from '../presenters/drafts.presenter.ts';

/** Below this the cut of a strip was more guess than find. */
const SURE_CUT = 0.5;

/**
 * Looks at a draft as a whole. Frames of one take have one size: the size most of them have counts, and the others are
 * refused by name. This is worked out each time, because a later batch may change which size is the usual one.
 */
export function viewDraft(draft: Draft, all: DraftPicture[]): DraftParts {
  const sorted = [...all].sort((a, b) => byName(a.name, b.name));
  const size = usualSize(sorted);
  const frames = sorted.filter((picture) => sizeOf(picture) === size);
  const odd = sorted.filter((picture) => sizeOf(picture) !== size);
  const names = frames.map(({ name }) => name);
  const { numbers, firstFrame, missing, repeated } = readFrameNumbers(names);
  const single = frames.length === 1;
  const warnings: string[] = [];
  if (single && !isStrip(draft)) {
    warnings.push('One frame is not a flight. Add the others, or say how this picture is cut into frames.');
  }
  if (single && (draft.grid?.confidence ?? 1) < SURE_CUT && isStrip(draft)) {
    warnings.push('Where one frame ends and the next begins is hard to tell here; look at the cut before you post.');
  }
  if (missing.length > 0) {
    const [frame, is, it] = missing.length === 1 ? ['Frame', 'is', 'it'] : ['Frames', 'are', 'them'];
    warnings.push(`${frame} ${sayNumbers(missing)} ${is} missing between the files. Add ${it} if you can.`);
  }
  if (repeated.length > 0) {
    warnings.push(
      `More than one file carries the number ${sayNumbers(repeated)}; take out the ones that do not belong.`,
    );
  }
  const strays = names.filter((_, index) => numbers[index] === null);
  if (strays.length > 0 && strays.length < names.length) warnings.push(sayStrays(strays));
  return {
    draft,
    pictures: frames.map((picture, index) => ({ picture, number: single ? null : numbers[index]! })),
    firstFrame: single ? null : firstFrame,
    missingFrames: missing,
    refused: [...draft.refused, ...odd.map((picture) => refuseOddSize(picture, frames[0]!))],
    warnings,
    ready: frames.length > 1 || (single && isStrip(draft)),
  };
}

/** A name without a number among numbered ones: the strip then goes by the order of names, and no gap shows. */
function sayStrays(strays: string[]): string {
  const [first, ...others] = strays;
  const more = others.length === 0 ? '' : others.length === 1 ? ' and one more' : ` and ${others.length} more`;
  const [carry, it, it2] = others.length === 0 ? ['carries', 'it', 'it does'] : ['carry', 'them', 'they do'];
  return `“${first}”${more} ${carry} no frame number like the rest; take ${it} out if ${it2} not belong.`;
}

function isStrip(draft: Draft): boolean {
  return draft.grid !== null && draft.grid.count > 1;
}

function sizeOf({ width, height }: DraftPicture): string {
  return `${width} × ${height}`;
}

/** The size that most pictures have; of two equally common ones that of the earlier picture. */
function usualSize(pictures: DraftPicture[]): string | undefined {
  const counts = new Map<string, number>();
  for (const picture of pictures) counts.set(sizeOf(picture), (counts.get(sizeOf(picture)) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0];
}

function refuseOddSize(picture: DraftPicture, usual: DraftPicture): RefusedFile {
  const reason = `“${picture.name}” is ${sizeOf(picture)} px; the other frames are ${sizeOf(usual)} px.`;
  return { name: picture.name, reason };
}
