/** Something that lies along the axis from `left` to `right`, px of the screen. */
export interface Extent {
  left: number;
  right: number;
}

/**
 * Gives each extent the first row in which it meets no other, in the order given; rows count from 0.
 * @param gap px that stay free between two neighbours of one row
 */
export function packRows(extents: readonly Extent[], gap = 6): number[] {
  const rows: Extent[][] = [];
  return extents.map((extent) => {
    const free = rows.findIndex((row) =>
      row.every((other) => extent.right + gap <= other.left || other.right + gap <= extent.left),
    );
    const row = free === -1 ? rows.length : free;
    (rows[row] ??= []).push(extent);
    return row;
  });
}

/** Rough width of a label in the body face at 12 px, px: good enough to keep labels apart before they are drawn. */
export function labelWidth(text: string): number {
  return text.length * 6.6;
}
