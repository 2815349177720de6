import type { Candidate } from './candidates.ts';

/** Candidates of one thing, in order of frames, at most one a frame. */
export type Path = Candidate[];

/** Longest stretch of frames without a candidate that a path bridges. */
const LONGEST_GAP = 8;
/** Ways into one candidate that are kept: the best ones hold everything that a later bend could turn round. */
const MOST_STATES = 8;
/** Dearest single step; a jump that costs more than this is between two things. */
const DEAREST = 5;
/** What one more candidate is worth; costs are in the same unit. */
const REWARD = 1;
/** Most that one change of velocity costs: a bounce is a change that physics allows. */
const BOUNCE = 1.6;
/** Passing over one frame costs more than any turn, so that none is left out to make a turn look smoother. */
const FIRST_HIDDEN_FRAME = 0.9;
const NEXT_HIDDEN_FRAME = 0.35;

interface State {
  score: number;
  from: State | null;
  at: Candidate;
  /** First frame on which the drawing of `at` shows: on twos a step takes two frames, not one after a halt. */
  since: number;
  /** Velocity on arrival, px/frame; null at the start of a path. */
  velocity: { x: number; y: number } | null;
}

/**
 * The best path through the candidates of all frames by dynamic programming over pairs of neighbours, with a cost for
 * every change of velocity (an acceleration that a fall explains is nearly free, a bounce costs a fixed price) and for
 * every change of size and colour.
 */
export function bestPath(frames: Candidate[][]): Path {
  const states = new Map<Candidate, State[]>();
  let best: State | null = null;
  for (let index = 0; index < frames.length; index++) {
    for (const candidate of frames[index]) {
      const own: State[] = [{ score: worth(candidate), from: null, at: candidate, since: index, velocity: null }];
      for (let back = 1; back <= Math.min(LONGEST_GAP + 1, index); back++) {
        for (const earlier of frames[index - back]) {
          const link = extend(states.get(earlier) ?? [], earlier, candidate);
          if (link) own.push(link);
        }
      }
      states.set(candidate, own.toSorted((a, b) => b.score - a.score).slice(0, MOST_STATES));
      for (const state of own) if (!best || state.score > best.score) best = state;
    }
  }
  const path: Path = [];
  for (let state = best; state; state = state.from) path.unshift(state.at);
  return path;
}

function extend(states: State[], earlier: Candidate, candidate: Candidate): State | null {
  const gap = candidate.index - earlier.index;
  const hidden = gap === 1 ? 0 : FIRST_HIDDEN_FRAME + NEXT_HIDDEN_FRAME * (gap - 2);
  const price = changeOfLook(earlier, candidate) + leapBetween(earlier, candidate) + hidden;
  if (price > DEAREST) return null;
  const held = isSameDrawing(earlier, candidate);
  let best: State | null = null;
  for (const state of states) {
    const steps = held ? 1 : candidate.index - state.since;
    const velocity = {
      x: (candidate.whole.x - earlier.whole.x) / steps,
      y: (candidate.whole.y - earlier.whole.y) / steps,
    };
    const turn = held ? 0 : changeOfVelocity(state.velocity, velocity, earlier, steps);
    const score = state.score + worth(candidate) - price - turn;
    if (best && score <= best.score) continue;
    best = { score, from: state, at: candidate, since: candidate.index, velocity };
    if (held) Object.assign(best, { since: state.since, velocity: state.velocity });
  }
  return best;
}

/** A drawing shown again: on twos and threes, or a thing at rest. */
function isSameDrawing(a: Candidate, b: Candidate): boolean {
  const wander = Math.max(0.6, 0.02 * Math.sqrt(a.whole.area));
  return Math.hypot(b.whole.x - a.whole.x, b.whole.y - a.whole.y) < wander;
}

function worth(candidate: Candidate): number {
  // A faint thing is worth nearly as much as a bright one, or a path would change over to a counter to gain.
  return REWARD * Math.min(1, 0.75 + candidate.contrast / 200);
}

/** Nothing crosses the picture in one frame: steps far beyond the thing's size are jumps between things. */
function leapBetween(a: Candidate, b: Candidate): number {
  const size = sizeOf(a);
  const speed = Math.hypot(b.whole.x - a.whole.x, b.whole.y - a.whole.y) / (b.index - a.index);
  return (3 * Math.max(0, speed - 3 * size - 20)) / (size + 10);
}

function changeOfVelocity(was: State['velocity'], now: { x: number; y: number }, at: Candidate, steps: number): number {
  const size = sizeOf(at);
  if (!was) return Math.min(0.5, (0.1 * Math.hypot(now.x, now.y)) / (size + 5));
  const bend = Math.hypot(now.x - was.x, now.y - was.y) / Math.min(4, steps);
  const expected = 2 + 0.12 * size + 0.1 * Math.hypot(was.x, was.y);
  return Math.min(BOUNCE + (0.02 * bend) / expected, 0.12 * (bend / expected) ** 2);
}

/** Diameter of a disc of the same area, px. */
function sizeOf(candidate: Candidate): number {
  return 2 * Math.sqrt(candidate.whole.area / Math.PI);
}

function changeOfLook(a: Candidate, b: Candidate): number {
  const size = Math.min(1.5, Math.abs(Math.log(b.whole.area / a.whole.area)));
  const colour = Math.hypot(b.colour[0] - a.colour[0], b.colour[1] - a.colour[1], b.colour[2] - a.colour[2]);
  return 0.5 * size ** 2 + Math.min(0.8, (colour / 90) ** 2);
}
