/** A rectangle, picture px, y downwards. */
export interface Box {
  left: number;
  top: number;
  width: number;
  height: number;
}

/** A label that wants to stand beside a point. Earlier requests are placed first. */
export interface LabelRequest {
  key: string;
  x: number;
  y: number;
  width: number;
  height: number;
  /** Free space between the point and the label. */
  away: number;
  /** The side to try first. */
  prefer?: 'left' | 'right' | 'above' | 'below';
  /** It stands even where it covers something; others are left out when there is no free place. */
  must?: boolean;
}

export interface PlacedLabel extends Box {
  key: string;
}

export function overlaps(a: Box, b: Box): boolean {
  return a.left < b.left + b.width && b.left < a.left + a.width && a.top < b.top + b.height && b.top < a.top + a.height;
}

function inside(box: Box, bounds: Box): boolean {
  return (
    box.left >= bounds.left &&
    box.top >= bounds.top &&
    box.left + box.width <= bounds.left + bounds.width &&
    box.top + box.height <= bounds.top + bounds.height
  );
}

/** Places to try around the point, best first: above left and above right read best beside an arc. */
function candidates({ x, y, width, height, away, prefer }: LabelRequest): Box[] {
  const left = x - width - away;
  const right = x + away;
  const above = y - height - away;
  const below = y + away;
  const middleX = x - width / 2;
  const middleY = y - height / 2;
  const first: Record<NonNullable<LabelRequest['prefer']>, [number, number][]> = {
    left: [
      [left, middleY],
      [left, above],
    ],
    right: [
      [right, middleY],
      [right, above],
    ],
    above: [
      [middleX, above],
      [left, above],
      [right, above],
      [left, middleY],
    ],
    below: [
      [middleX, below],
      [left, below],
      [right, below],
      [left, middleY],
    ],
  };
  const places: [number, number][] = [
    ...(prefer ? first[prefer] : []),
    [left, above],
    [right, above],
    [middleX, above - away],
    [left, middleY],
    [right, middleY],
    [right, below],
    [left, below],
    [middleX, below + away],
    [left - 2 * away, above - 2 * away],
    [right + 2 * away, above - 2 * away],
    [middleX, above - 4 * away],
    [middleX, below + 4 * away],
  ];
  return places.map(([boxLeft, boxTop]) => ({ left: boxLeft, top: boxTop, width, height }));
}

/**
 * Finds each label a place beside its point that covers no obstacle, no earlier label, and lies within the bounds. A label
 * that finds none is left out, unless it must stand: then it takes its first place within the bounds.
 */
export function placeLabels(requests: readonly LabelRequest[], obstacles: readonly Box[], bounds: Box): PlacedLabel[] {
  const taken: Box[] = [...obstacles];
  const placed: PlacedLabel[] = [];
  for (const request of requests) {
    const places = candidates(request);
    const free = places.find((box) => inside(box, bounds) && !taken.some((other) => overlaps(box, other)));
    const box = free ?? (request.must ? (places.find((place) => inside(place, bounds)) ?? places[0]) : undefined);
    if (!box) continue;
    taken.push(box);
    placed.push({ key: request.key, ...box });
  }
  return placed;
}

/** A square around a point, as an obstacle. */
export function around(point: { x: number; y: number }, radius: number): Box {
  return { left: point.x - radius, top: point.y - radius, width: 2 * radius, height: 2 * radius };
}
