import type { Decision as WireDecision, Take as WireTake } from '../../shared/api/takes.ts';
import type { Decision } from '../entities/Decision.ts';
import type { Reading } from '../entities/Reading.ts';
import type { Take } from '../entities/Take.ts';
import type { TakeStamp } from '../entities/TakeStamp.ts';
import { presentPerson } from './people.presenter.ts';
import { presentStampBoard } from './stamps.presenter.ts';

/** A take with everything its wire shape shows. `take.shot` and `take.postedBy` are loaded. */
export interface TakeParts {
  take: Take;
  /** The decision that counts; null while it waits. */
  decision: Decision | null;
  /** Without its document. */
  reading: Reading | null;
  stamps: TakeStamp[];
  noteCount: number;
}

/** A take as it goes over the wire, without the document of its reading. */
export function presentTake({ take, decision, reading, stamps, noteCount }: TakeParts): WireTake {
  return {
    id: take.id,
    revision: take.revision,
    shotNumber: take.shot.number,
    number: take.number,
    postedBy: presentPerson(take.postedBy),
    postedAt: take.postedAt.toISOString(),
    review: take.review,
    decision: decision && presentDecision(decision),
    reading: { status: take.readingStatus, message: take.readingMessage },
    fps: { num: take.fpsNum, den: take.fpsDen },
    hold: take.hold,
    firstFrame: take.firstFrame,
    frames: take.frames,
    width: take.width,
    height: take.height,
    changed: take.changed,
    intended: take.intended,
    missingFrames: take.missingFrames,
    sketch: reading?.sketch ?? null,
    noteCount,
    stamps: presentStampBoard(take.stampsRevision, stamps),
  };
}

function presentDecision(decision: Decision): WireDecision {
  return {
    state: decision.state,
    remark: decision.remark,
    by: presentPerson(decision.by),
    decidedAt: decision.decidedAt.toISOString(),
  };
}
