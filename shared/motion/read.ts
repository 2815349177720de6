import type { Finding, Reading, ReadObject } from '../reading/document.ts';
import { READING_FORMAT } from '../reading/document.ts';
import { DEFAULT_TOLERANCES } from '../reading/tolerances.ts';
import type { Account } from './account.ts';
import { balanceOf } from './body.ts';
import { cautionsOf } from './cautions.ts';
import { holdContest } from './choose.ts';
import { gatherDrawings, orderedMarks } from './drawings.ts';
import { ENGINE_VERSION } from './engine.ts';
import { covariance } from './fit.ts';
import { describeFlight } from './flight.ts';
import type { HoldPattern } from './hold.ts';
import { holdOf, exposuresOf } from './hold.ts';
import { joinParts, partsOf } from './parts.ts';
import { prepare, toLocal } from './prepare.ts';
import { contactsOf, findingsOf } from './report.ts';
import { readStream } from './stream.ts';
import type { MotionInput, MotionOptions, Track } from './types.ts';
import { STANDARD_GRAVITY } from './units.ts';
import type { TrackView } from './view.ts';
import { flightsOf } from './view.ts';

interface TrackReading {
  object: ReadObject;
  findings: Finding[];
  cautions: string[];
  pattern: HoldPattern;
}

/** Fewest drawings from which a flight can be read. */
const LEAST_DRAWINGS = 4;

/** Cost by which a fault must beat the account without it to be modelled where it is within its tolerance. */
const PLAIN_TO_SEE = 15;

/**
 * Reads a take: where every thing flew, how true each flight is, what an animator would call off and how to mend it.
 * Pure: the same input gives the same reading. Data that cannot be read give a named outcome, never an exception.
 */
export function readMotion(input: MotionInput, options: MotionOptions = {}): Reading {
  const tracks = input.tracks.map((track) => readTrack(track, input, options));
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
      exposure: exposuresOf(pattern, input.frames),
      scale: input.scale ?? null,
    },
    camera: input.camera ?? { moved: false, offsets: [] },
    objects: tracks.map((track) => track.object),
    findings: tracks.flatMap((track) => track.findings),
    cautions: [...new Set([...(input.cautions ?? []), ...tracks.flatMap((track) => track.cautions)])],
  };
}

/** One thing, from its marks to its findings. */
function readTrack(track: Track, input: MotionInput, options: MotionOptions): TrackReading {
  const tolerances = options.tolerances ?? DEFAULT_TOLERANCES;
  if (track.what === 'stream') {
    const stream = readStream(track, tolerances);
    const object = { ...emptyObject(track), flights: stream.flights };
    const read = stream.flights.length > 0;
    return {
      object: { ...object, outcome: read ? 'read' : 'too-few-marks' },
      findings: stream.findings,
      cautions: [
        read
          ? `${track.id} is a drawn stream: its shape is read, its timing is not.`
          : `${track.id}: five points along a stream are the least that show its arc.`,
      ],
      pattern: holdOf([], input.hold),
    };
  }

  // A body flies at its balance point; other things at their own marks.
  const balance = track.what === 'body' ? balanceOf(track.points ?? [], track.shares) : null;
  const marks = orderedMarks(balance?.marks ?? track.marks);
  const pattern = balance ? holdOf(marks, 1) : holdOf(marks, input.hold);
  const object: ReadObject = { ...emptyObject(track), marks, points: balance?.points ?? [] };
  const nothing = (outcome: ReadObject['outcome'], caution: string): TrackReading => ({
    object: { ...object, outcome },
    findings: [],
    cautions: [caution],
    pattern,
  });

  // Drawings, not frames: what is held is one drawing, seen more than once.
  const drawings = gatherDrawings(marks, pattern.hold, pattern.phase, pattern.starts);
  if (drawings.length < LEAST_DRAWINGS) {
    return nothing(
      'too-few-marks',
      `${track.id} has ${drawings.length} drawings; four are the least that show a flight.`,
    );
  }
  const local = toLocal(drawings, input.width, input.height);
  const { field, stretches, lost, odd, moves } = prepare(local, track.hand, {
    airy: track.light === true || !!input.scale,
    scaled: !!input.scale,
  });
  if (!moves) return nothing('no-motion', `${track.id} does not move.`);

  // A long track is read in parts, cut at contacts, and put together again.
  const parts = partsOf(stretches, drawings.length);
  if (parts.length > 1) {
    const readings = parts.map((part) => {
      const own = drawings.slice(part.from, part.to + 1).flatMap((drawing) => drawing.marks);
      return readTrack({ ...track, what: 'thing', marks: own }, { ...input, hold: pattern.hold }, options);
    });
    return { ...joinParts(object, readings), pattern };
  }

  // Every account of what happened, true or faulty, competes on the same drawings.
  const contest = holdContest(field, stretches, lost, odd);
  if (!contest || !fliesAtAll(contest.chosen)) {
    return nothing('not-in-flight', `${track.id} rests, rolls or is carried; nothing in it flies.`);
  }
  const unplaced = track.what === 'body' && !balance;
  const viewOf = (chosen: Account): TrackView => {
    const account = reported(chosen, balance?.error ?? 0);
    account.covariance = covariance(account.fit, { ...field.samples, weight: account.weight });
    return {
      id: track.id,
      field,
      contest,
      account,
      scores: new Map(),
      flights: flightsOf(track.id, account, field).map((one) => (unplaced ? { ...one, judged: false } : one)),
      tolerances,
      origin: local.origin,
      firstFrame: input.firstFrame,
      hold: pattern.hold === 'mixed' ? 1 : pattern.hold,
      fps: input.fps,
      scale: input.scale ?? null,
      expectedGravity: input.gravity ?? STANDARD_GRAVITY,
      light: track.light === true || isSlowed(account),
    };
  };

  // A fault that is neither past its tolerance nor plain to see is no reason to bend the numbers around it.
  let view = viewOf(contest.chosen);
  let findings = findingsOf(view);
  if (!findings.length && contest.chosen.fault && contest.clean.cost - contest.chosen.cost < PLAIN_TO_SEE) {
    view = viewOf(contest.clean);
    findings = findingsOf(view);
  }
  const flights = view.flights.map((flight) => describeFlight(view, flight, local.centre, findings));
  const cautions = unplaced
    ? [`${track.id} is a body: place its points (head, hips and feet at least), and it is judged at its balance point.`]
    : cautionsOf(view);
  return {
    object: {
      ...object,
      outcome: unplaced ? 'not-judged' : 'read',
      contacts: contactsOf(view, local.centre),
      flights,
    },
    findings,
    cautions: [...cautions, ...(pattern.caution ? [pattern.caution] : [])],
    pattern,
  };
}

/** Whether any flight of an account falls by more than its noise: a thing that rests, rolls or is carried does not. */
function fliesAtAll(account: Account): boolean {
  const { path, knots, theta } = account.fit;
  const least = Math.max(1, 4 * Math.sqrt(account.noise2));
  return path.spans.some((span, k) => {
    const length = knots.t[k + 1]! - knots.t[k]!;
    return span.kind === 'flight' && (theta[span.gravity]! * length * length) / 8 > least;
  });
}

/** Whether air slows the thing: then its gravity says nothing. */
function isSlowed(account: Account): boolean {
  return account.fault?.kind === 'shape' && account.fault.name === 'drag';
}

/** The chosen account with its noise as it is reported: without the prior of the search, with the error of a balance point. */
function reported<A extends { noise2: number; freedom: number; squares: number }>(chosen: A, error: number): A {
  return { ...chosen, noise2: Math.max(1e-8, chosen.squares / chosen.freedom) + error * error };
}

function emptyObject(track: Track): ReadObject {
  return {
    id: track.id,
    what: track.what ?? 'thing',
    outcome: 'read',
    points: [],
    marks: [],
    contacts: [],
    flights: [],
  };
}
