import type { Finding, Flight, Hold, Reading, ReadObject } from '../reading/document.ts';
import { READING_FORMAT } from '../reading/document.ts';
import { DEFAULT_TOLERANCES } from '../reading/tolerances.ts';
import { holdContest } from './choose.ts';
import { gatherDrawings, orderedMarks, replicateNoise, suspects } from './drawings.ts';
import { ENGINE_VERSION } from './engine.ts';
import { FINDING_RULES } from './findings/table.ts';
import { covariance } from './fit.ts';
import { describeFlight } from './flight.ts';
import type { HoldPattern } from './hold.ts';
import { exposureOf, findHold, findPhase, quantile } from './hold.ts';
import { chartOf, mendOf } from './mend.ts';
import { partition, roughNoise } from './partition.ts';
import { stretchesOf } from './spans.ts';
import type { MotionInput, MotionOptions, Track } from './types.ts';
import type { TrackView } from './view.ts';
import { flightsOf, frameOf, framesOf } from './view.ts';

interface TrackReading {
  object: ReadObject;
  findings: Finding[];
  cautions: string[];
  pattern: HoldPattern;
}

/**
 * Reads a take: where every thing flew, how true each flight is, what an animator would call off and how to mend it.
 * Pure: the same input gives the same reading. Data that cannot be read give a named outcome, never an exception.
 */
export function readMotion(input: MotionInput, options: MotionOptions = {}): Reading {
  const tracks = input.tracks.map((track) => readTrack(track, input, options));
  const cautions = [...(input.cautions ?? []), ...tracks.flatMap((track) => track.cautions)];
  const pattern = tracks[0]?.pattern;
  return {
    format: READING_FORMAT,
    ...(input.id === undefined ? {} : { id: input.id }),
    engine: ENGINE_VERSION,
    source: {
      kind: input.kind,
      frames: input.frames,
      width: input.width,
      height: input.height,
      firstFrame: input.firstFrame,
      fps: input.fps,
      hold: pattern?.hold ?? input.hold ?? 1,
      exposure: exposures(pattern, input.frames),
      scale: input.scale ?? null,
    },
    camera: input.camera ?? { moved: false, offsets: [] },
    objects: tracks.map((track) => track.object),
    findings: tracks.flatMap((track) => track.findings),
    cautions: [...new Set(cautions)],
  };
}

/** One thing, from its marks to its findings. */
function readTrack(track: Track, input: MotionInput, options: MotionOptions): TrackReading {
  const marks = orderedMarks(track.marks);
  const pattern = patternOf(marks, input.hold);
  const object: ReadObject = {
    id: track.id,
    what: 'thing',
    outcome: 'read',
    points: [],
    marks,
    contacts: [],
    flights: [],
  };
  const nothing = (outcome: ReadObject['outcome'], caution: string): TrackReading => ({
    object: { ...object, outcome },
    findings: [],
    cautions: [caution],
    pattern,
  });
  const drawings = gatherDrawings(marks, pattern.hold, pattern.phase, pattern.starts);
  if (drawings.length < 4) {
    return nothing(
      'too-few-marks',
      `${track.id}: ${drawings.length} drawings are too few to read a flight; four are the least.`,
    );
  }

  const origin = drawings[0]!.t;
  const centre =
    input.width > 0 && input.height > 0
      ? { x: input.width / 2, y: input.height / 2 }
      : { x: drawings[0]!.x, y: drawings[0]!.y };
  const local = drawings.map((drawing) => ({
    ...drawing,
    t: drawing.t - origin,
    x: drawing.x - centre.x,
    y: drawing.y - centre.y,
  }));
  const replicates = replicateNoise(drawings);
  const rough = replicates.freedom >= 6 ? Math.sqrt(replicates.sum / replicates.freedom) : roughNoise(local);
  const noise = Math.min(3, Math.max(0.25, rough));
  const reach = Math.hypot(spread(local.map((d) => d.x)), spread(local.map((d) => d.y)));
  if (reach < 6 * noise) return nothing('no-motion', `${track.id} does not move.`);

  const odd = suspects(local, noise);
  const trusted = local.map((_, i) => i).filter((i) => !odd.includes(i));
  const pieces = partition(
    trusted.map((i) => local[i]!),
    noise,
  ).map((piece) => ({ ...piece, from: trusted[piece.from]!, to: trusted[piece.to]! }));
  const stretches = stretchesOf(local, pieces, noise, odd);
  const field = {
    drawings: local,
    replicates,
    noise: rough,
    step: quantile(
      local.slice(1).map((d, i) => d.t - local[i]!.t),
      0.5,
    ),
    samples: {
      t: Float64Array.from(local, (d) => d.t),
      x: Float64Array.from(local, (d) => d.x),
      y: Float64Array.from(local, (d) => d.y),
      weight: Float64Array.from(local, (d) => d.weight),
    },
  };
  const lost = pieces.filter((piece) => piece.kind === 'lost').map((piece) => piece.from);
  const contest = holdContest(field, stretches, lost, odd);
  if (!contest || !contest.chosen.fit.path.spans.some((span) => span.kind === 'flight')) {
    return nothing('not-in-flight', `${track.id} rests, rolls or is carried; nothing in it flies.`);
  }
  const account = { ...contest.chosen };
  account.covariance = covariance(account.fit, { ...field.samples, weight: account.weight });

  const view: TrackView = {
    id: track.id,
    field,
    contest,
    account,
    flights: flightsOf(track.id, account),
    tolerances: options.tolerances ?? DEFAULT_TOLERANCES,
    origin,
    firstFrame: input.firstFrame,
    hold: pattern.hold === 'mixed' ? 1 : pattern.hold,
    fps: input.fps,
    scale: input.scale ?? null,
  };
  const flights: Flight[] = view.flights.map((flight) => describeFlight(view, flight, centre));
  return {
    object: { ...object, contacts: contactsOf(view, centre), flights },
    findings: findingsOf(view),
    cautions: account.depth
      ? [`${track.id} moves towards or away from the camera; that is taken out and not called a fault.`]
      : [],
    pattern,
  };
}

function findingsOf(view: TrackView): Finding[] {
  return FINDING_RULES.flatMap((rule) => rule.find(view)).map((draft) => {
    const whole = framesOf(view, draft.flight);
    const from = Math.max(whole.from, Math.floor(frameOf(view, draft.from)));
    const to = Math.min(whole.to, Math.ceil(frameOf(view, draft.to)));
    return {
      id: `${draft.flight.id}-${draft.kind}-${from}`,
      kind: draft.kind,
      object: view.id,
      flight: draft.flight.id,
      fromFrame: from,
      toFrame: to,
      severity: draft.severity,
      title: draft.title,
      detail: draft.detail,
      mend: mendOf(view, draft),
      chart: draft.kind === 'pop' || draft.kind === 'held-frame' ? [] : chartOf(view, draft.flight),
    };
  });
}

function contactsOf(view: TrackView, centre: { x: number; y: number }): ReadObject['contacts'] {
  const { path, knots } = view.account.fit;
  const out: ReadObject['contacts'] = [];
  for (let k = 1; k < path.spans.length; k += 1) {
    const released = path.spans[k - 1]!.kind === 'rest' && path.spans[k]!.tangent;
    if (released) continue;
    out.push({
      frame: frameOf(view, knots.t[k]!),
      x: knots.x[k]! + centre.x,
      y: knots.y[k]! + centre.y,
      origin: 'read',
    });
  }
  return out;
}

function patternOf(marks: ReadObject['marks'], hold: Hold | undefined): HoldPattern {
  if (hold === undefined) return findHold(marks);
  if (hold === 'mixed') return { hold, phase: 1, starts: exposureOf(marks) };
  return { hold, phase: hold === 1 ? 1 : findPhase(marks, hold), starts: [] };
}

function exposures(pattern: HoldPattern | undefined, frames: number): number[] {
  if (!pattern) return [];
  if (pattern.hold === 'mixed') return pattern.starts;
  const { hold } = pattern;
  const out: number[] = [];
  for (let frame = 1; frame <= frames; frame += 1)
    if ((frame - pattern.phase) % hold === 0 || frame === 1) out.push(frame);
  return out;
}

function spread(values: number[]): number {
  return Math.max(...values) - Math.min(...values);
}
