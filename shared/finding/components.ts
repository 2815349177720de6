/** A connected region of a mask: its box, its pixels and where they balance. `x1`, `y1` are the last column and row. */
export interface Region {
  label: number;
  x0: number;
  y0: number;
  x1: number;
  y1: number;
  area: number;
  /** Sums of the pixels' columns and rows. */
  sumX: number;
  sumY: number;
}

/**
 * Labels the 8-connected regions of a mask with two passes and a union-find over labels.
 * @param mask one byte a pixel, 0 is outside
 * @returns the label of each pixel (0 outside) and the regions, `regions[k].label` being k + 1
 */
export function labelRegions(
  mask: Uint8Array,
  width: number,
  height: number,
): { labels: Int32Array; regions: Region[] } {
  const labels = new Int32Array(width * height);
  const parent: number[] = [0];
  for (let y = 0; y < height; y++) {
    const row = y * width;
    for (let x = 0; x < width; x++) {
      if (mask[row + x] === 0) continue;
      let label = x > 0 ? labels[row + x - 1] : 0;
      if (y > 0) {
        for (let nx = Math.max(0, x - 1); nx <= Math.min(width - 1, x + 1); nx++) {
          const above = labels[row - width + nx];
          if (above === 0) continue;
          if (label === 0) label = above;
          else if (label !== above) join(parent, label, above);
        }
      }
      if (label === 0) {
        label = parent.length;
        parent.push(label);
      }
      labels[row + x] = label;
    }
  }
  return { labels, regions: gather(labels, parent, width, height) };
}

function find(parent: number[], label: number): number {
  let root = label;
  while (parent[root] !== root) root = parent[root];
  for (let at = label; parent[at] !== root; ) {
    const next = parent[at];
    parent[at] = root;
    at = next;
  }
  return root;
}

function join(parent: number[], a: number, b: number): void {
  const rootA = find(parent, a);
  const rootB = find(parent, b);
  if (rootA < rootB) parent[rootB] = rootA;
  else parent[rootA] = rootB;
}

function gather(labels: Int32Array, parent: number[], width: number, height: number): Region[] {
  const regions: Region[] = [];
  const final = new Int32Array(parent.length);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const label = labels[y * width + x];
      if (label === 0) continue;
      const root = find(parent, label);
      if (final[root] === 0) {
        regions.push({ label: regions.length + 1, x0: x, y0: y, x1: x, y1: y, area: 0, sumX: 0, sumY: 0 });
        final[root] = regions.length;
      }
      const region = regions[final[root] - 1];
      labels[y * width + x] = region.label;
      if (x < region.x0) region.x0 = x;
      if (x > region.x1) region.x1 = x;
      region.y1 = y;
      region.area++;
      region.sumX += x;
      region.sumY += y;
    }
  }
  return regions;
}
