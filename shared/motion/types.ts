import type { FrameRate, Hold, Mark, Point, Reading, ReadObject, Source } from '../reading/document.ts';
import type { Tolerances } from '../reading/tolerances.ts';

/** One thing's marks over frames, as the finder, a hand or a file gives them. Camera moves are already taken out. */
export interface Track {
  /** A, B, C: as the finding names things. */
  id: string;
  /** thing: read by its own marks. body: by its balance point. stream: one whole arc in every picture, read for shape. */
  what?: ReadObject['what'];
  marks: Mark[];
  /** A light thing, which air slows: its gravity is not judged, its shape is. */
  light?: boolean;
  hand?: HandWork;
  /** Body only: points placed by someone, on as many frames as wanted. */
  points?: BodyPoint[];
  /** Body only: shares of the body's mass by segment; left out: the published table. */
  shares?: Partial<Record<SegmentName, number>>;
  /** Stream only: points along the arc, picture by picture. */
  arcs?: { frame: number; points: Point[] }[];
}

/** What someone set, moved or took away; it stands, and everything else is read anew around it. Frames of the document. */
export interface HandWork {
  /** Instants at which the thing touches something between two flights. A contact read near one of them gives way to it. */
  contacts?: number[];
  takeOffs?: number[];
  landings?: number[];
  /** Contacts (also take-offs and landings) that are none: near these frames none is read. Joins the flights around. */
  removed?: number[];
  /** Spans that are no free flight (wings, a string, magic): shown and measured, not judged, and no gravity for the others. */
  notFree?: { from: number; to: number }[];
}

export const BODY_POINTS = [
  'head',
  'shoulder',
  'hip',
  'shoulder-left',
  'shoulder-right',
  'elbow-left',
  'elbow-right',
  'wrist-left',
  'wrist-right',
  'hip-left',
  'hip-right',
  'knee-left',
  'knee-right',
  'ankle-left',
  'ankle-right',
  'feet',
] as const;
/** Names of body points. `shoulder`, `hip` and `feet` are the middles of both sides, for those who place three points only. */
export type BodyPointName = (typeof BODY_POINTS)[number];
export interface BodyPoint extends Point {
  frame: number;
  name: BodyPointName;
}
export type SegmentName = 'head' | 'trunk' | 'upper-arm' | 'forearm' | 'hand' | 'thigh' | 'shank' | 'foot';

/** Everything `readMotion` needs to know of a take: no pictures, only where things were. */
export interface MotionInput {
  id?: string;
  kind: Source['kind'];
  /** Number of pictures, also those without a mark. */
  frames: number;
  /** Picture size in px; 0 when unknown (marks from a file). */
  width: number;
  height: number;
  firstFrame: number;
  fps: FrameRate;
  /** Left out: found from the marks. */
  hold?: Hold;
  scale?: { pxPerMetre: number } | null;
  /** The production's gravity in m/s², judged against where there is a scale; left out: standard gravity, 9.80665. */
  gravity?: number;
  camera?: Reading['camera'];
  tracks: Track[];
  /** Sentences that the finder wants to be said along with the engine's own. */
  cautions?: string[];
}

export interface MotionOptions {
  tolerances?: Tolerances;
}
