/** A piece of a note: plain words, or a frame it speaks of. */
export type NotePiece = { text: string; frame: null } | { text: string; frame: number };

/** Below this a number in a sentence is more likely a count than a frame ("move it 3 px"). */
const LEAST_TELLING = 100;

/**
 * Cuts a note where it names frames of the strip in the production's numbers, "1008–1012" in two.
 * @param first production number of the first frame
 * @param last production number of the last
 */
export function frameMentions(body: string, first: number, last: number): NotePiece[] {
  const pieces: NotePiece[] = [];
  let at = 0;
  for (const match of body.matchAll(/(?<![\w.,])\d+(?![\w%]|[.,]\d)/g)) {
    const frame = Number(match[0]);
    if (frame < LEAST_TELLING || frame < first || frame > last) continue;
    if (match.index > at) pieces.push({ text: body.slice(at, match.index), frame: null });
    pieces.push({ text: match[0], frame });
    at = match.index + match[0].length;
  }
  if (at < body.length) pieces.push({ text: body.slice(at), frame: null });
  return pieces;
}
