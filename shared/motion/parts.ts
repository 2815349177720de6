import type { Contact, Finding, Flight, ReadObject } from '../reading/document.ts';
import type { Stretch } from './spans.ts';

/** A run of drawings, from and to by index. */
export interface Part {
  from: number;
  to: number;
}

/** Most flights read as one path; a longer track is read in parts, so that its cost grows with its length. */
const MOST_FLIGHTS = 6;

/** Drawings of a rest that the next part starts with, so that it sees the take-off. */
const OVERLAP = 3;

/** Where a long track is cut into parts: at contacts and rests, every few flights. One part when it is short. */
export function partsOf(stretches: readonly Stretch[], count: number): Part[] {
  const parts: Part[] = [];
  let from = 0;
  let flights = 0;
  stretches.forEach((stretch, k) => {
    if (stretch.kind === 'flight') flights += 1;
    const next = stretches[k + 1];
    if (flights < MOST_FLIGHTS || !next) return;
    if (stretch.kind === 'roll' || next.kind === 'rest') return;
    parts.push({ from, to: next.from - 1 });
    from = stretch.kind === 'rest' ? Math.max(stretch.from, next.from - OVERLAP) : next.from;
    flights = 0;
  });
  parts.push({ from, to: count - 1 });
  return parts;
}

/** What is read of one thing: the object and its findings. */
export interface PartReading {
  object: ReadObject;
  findings: Finding[];
  cautions: string[];
}

/**
 * Parts put together again: flights numbered through, and a contact where the last flight of one part meets the first of the
 * next, at the moment halfway between their nearest drawings when both are in the air there.
 */
export function joinParts(whole: ReadObject, parts: readonly PartReading[]): PartReading {
  const flights: Flight[] = [];
  const contacts: Contact[] = [];
  const findings: Finding[] = [];
  for (const part of parts) {
    const names = new Map<string, string>();
    const before = flights[flights.length - 1];
    const first = part.object.flights[0];
    if (before && first && before.landing === null && first.takeOff === null) {
      const meeting = meetingOf(before, first);
      if (meeting) {
        before.landing = meeting.frame;
        first.takeOff = meeting.frame;
        contacts.push(meeting);
      }
    }
    for (const flight of part.object.flights) {
      const id = `${whole.id}${flights.length + 1}`;
      names.set(flight.id, id);
      flights.push({ ...flight, id });
    }
    contacts.push(...part.object.contacts);
    for (const finding of part.findings) {
      const flight = names.get(finding.flight ?? '') ?? finding.flight;
      findings.push({ ...finding, flight, id: `${flight ?? whole.id}-${finding.kind}-${finding.fromFrame}` });
    }
  }
  const read = parts.some((part) => part.object.outcome === 'read');
  return {
    object: { ...whole, outcome: read ? 'read' : (parts[0]?.object.outcome ?? 'not-in-flight'), flights, contacts },
    findings,
    cautions: [...new Set(parts.flatMap((part) => part.cautions))].filter(
      (caution) => !caution.includes('not in the strip'),
    ),
  };
}

/** Where two open flights meet: their true arcs carried on past their last and first drawings. */
function meetingOf(before: Flight, after: Flight): Contact | null {
  const a = before.trueArc;
  const b = after.trueArc;
  const end = a[a.length - 1];
  const start = b[0];
  if (!end || !start || a.length < 3 || b.length < 3) return null;
  const past = (t: number) => carry(a[a.length - 3]!, a[a.length - 2]!, end, t);
  const early = (t: number) => carry(b[2]!, b[1]!, start, t);
  let best = end.frame;
  let least = Infinity;
  for (let k = 0; k <= 200; k += 1) {
    const t = end.frame + ((start.frame - end.frame) * k) / 200;
    const gap = Math.abs(past(t).y - early(t).y);
    if (gap < least) {
      least = gap;
      best = t;
    }
  }
  return { frame: best, ...past(best), origin: 'read' };
}

interface At {
  frame: number;
  x: number;
  y: number;
}

/** The parabola through three points, at a time (Lagrange). */
function carry(p: At, q: At, r: At, t: number): { x: number; y: number } {
  const wp = ((t - q.frame) * (t - r.frame)) / ((p.frame - q.frame) * (p.frame - r.frame));
  const wq = ((t - p.frame) * (t - r.frame)) / ((q.frame - p.frame) * (q.frame - r.frame));
  const wr = ((t - p.frame) * (t - q.frame)) / ((r.frame - p.frame) * (r.frame - q.frame));
  return { x: wp * p.x + wq * q.x + wr * r.x, y: wp * p.y + wq * q.y + wr * r.y };
}
