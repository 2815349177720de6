/**
 * Median over time of each byte of a stretch of equal pictures (Laugraud et al. 2015 on where it holds: wherever the
 * background shows at least half of the time).
 * @param pictures the bytes of each picture, all of one length
 * @param from first byte, `to` the byte after the last
 * @param into where the medians are written, from `at` on
 */
export function medianBytes(pictures: Uint8Array[], from: number, to: number, into: Uint8Array, at: number): void {
  const count = pictures.length;
  const middle = count >> 1;
  const sorted = new Uint8Array(count);
  for (let byte = from; byte < to; byte++) {
    for (let k = 0; k < count; k++) {
      const value = pictures[k][byte];
      let place = k;
      while (place > 0 && sorted[place - 1] > value) {
        sorted[place] = sorted[place - 1];
        place--;
      }
      sorted[place] = value;
    }
    into[at + byte - from] = sorted[middle];
  }
}
