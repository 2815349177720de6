import type { ProductionEvent } from '../../shared/api/events.ts';
import type { FeedCard } from '../../shared/api/feed.ts';
import type { Member } from '../../shared/api/people.ts';
import type { Production } from '../../shared/api/productions.ts';
import type { Session } from '../../shared/api/session.ts';
import type { ShotWithTakes } from '../../shared/api/shots.ts';
import type { Sketch, Take } from '../../shared/api/takes.ts';
import type { Note, Thread } from '../../shared/api/threads.ts';
import { DEFAULT_TOLERANCES } from '../../shared/reading/tolerances.ts';

/** Builders of what the server sends, for tests of the client. Each is whole by itself; say only what matters. */

let made = 0;
const uuid = () => `00000000-0000-4000-8000-${String(++made).padStart(12, '0')}`;

export const BRITTA: Member = { id: uuid(), name: 'Britta Sand', initials: 'BS', role: 'animator' };
export const OTIS: Member = { id: uuid(), name: 'Otis Reed', initials: 'OR', role: 'mentor' };

/** A thing thrown from x 100 to 500 over 9 frames, read true; the arc rises to y 84. */
export function buildSketch(given: Partial<Sketch> = {}): Sketch {
  const points = Array.from({ length: 9 }, (_, index) => ({
    frame: index + 2,
    x: 100 + index * 50,
    y: 84 + (index - 4) ** 2 * 16,
  }));
  return {
    width: 640,
    height: 400,
    outcome: 'read',
    marks: points.map((point) => ({ object: 'A', ...point })),
    arcs: [{ object: 'A', flight: 'A1', points }],
    findings: [],
    caution: null,
    ...given,
  };
}

export function buildFinding(given: Partial<Sketch['findings'][number]> = {}): Sketch['findings'][number] {
  return {
    id: 'A1-too-straight-2',
    kind: 'too-straight',
    severity: 'visible',
    title: 'Rise is too even',
    flight: 'A1',
    fromFrame: 2,
    toFrame: 6,
    ...given,
  };
}

export function buildTake(given: Partial<Take> = {}): Take {
  return {
    id: uuid(),
    revision: 1,
    shotNumber: '020-0140',
    number: 1,
    postedBy: BRITTA,
    postedAt: '2026-11-30T09:00:00.000Z',
    review: 'waiting',
    decision: null,
    reading: { status: 'read', message: null },
    fps: { num: 24, den: 1 },
    hold: 1,
    firstFrame: 1001,
    frames: 12,
    width: 640,
    height: 400,
    changed: '',
    intended: '',
    missingFrames: [],
    sketch: buildSketch(),
    noteCount: 0,
    stamps: { revision: 0, stamps: [] },
    ...given,
  };
}

export function buildCard(given: Partial<FeedCard> = {}): FeedCard {
  return { take: buildTake(), poster: BRITTA, shotTitle: 'Kite over the yard', talk: [], ...given };
}

export function buildShot(given: Partial<ShotWithTakes> = {}): ShotWithTakes {
  const number = given.number ?? '020-0140';
  const takes = given.takes ?? [buildTake({ shotNumber: number })];
  return {
    id: uuid(),
    revision: 1,
    number,
    sequence: number.split('-')[0]!,
    title: 'Kite over the yard',
    state: takes.at(-1)?.review ?? null,
    animator: BRITTA,
    mentor: null,
    waitingSince: takes.at(-1)?.review === 'waiting' ? takes.at(-1)!.postedAt : null,
    nextTakeNumber: Math.max(0, ...takes.map((take) => take.number)) + 1,
    ...given,
    takes,
  };
}

export function buildNote(given: Partial<Note> = {}): Note {
  return {
    id: uuid(),
    threadId: uuid(),
    author: OTIS,
    body: 'The hand lets go on 1003.',
    writtenAt: '2026-11-30T10:00:00.000Z',
    stamps: { revision: 0, stamps: [] },
    ...given,
  };
}

export function buildThread(given: Partial<Thread> = {}): Thread {
  const id = given.id ?? uuid();
  return { id, takeId: uuid(), frame: 3, notes: [buildNote({ threadId: id })], ...given };
}

export function buildProduction(given: Partial<Production> = {}): Production {
  return {
    id: uuid(),
    slug: 'paper-yard',
    name: 'Paper Yard',
    myRole: 'animator',
    members: [BRITTA, OTIS],
    tolerances: DEFAULT_TOLERANCES,
    eventSeq: 0,
    ...given,
  };
}

export function buildSession(given: Partial<Session> = {}): Session {
  return {
    person: BRITTA,
    productions: [{ slug: 'paper-yard', name: 'Paper Yard', role: 'animator' }],
    ...given,
  };
}

/** One event of a log: a stamp board whose revision is the event's number, so that order shows in its effect. */
export function buildEvent(seq: number): ProductionEvent {
  return {
    seq,
    actor: OTIS,
    at: '2026-11-30T10:00:00.000Z',
    kind: 'stamps:changed',
    payload: { takeId: uuid(), noteId: null, board: { revision: seq, stamps: [] } },
  };
}

/** The event that tells of a take's state, with its card and shot. */
export function buildTakeEvent(
  seq: number,
  kind: 'take:posted' | 'take:read' | 'take:decided',
  take: Take,
): ProductionEvent {
  const current = { ...take, revision: seq };
  const { takes: _, ...shot } = buildShot({ number: take.shotNumber, revision: seq, takes: [current] });
  return {
    seq,
    actor: OTIS,
    at: '2026-11-30T10:00:00.000Z',
    kind,
    payload: { card: buildCard({ take: current }), shot },
  };
}
