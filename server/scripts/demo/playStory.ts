import path from 'node:path';
import type { Deps } from '../../deps.ts';
import { decideTake } from '../../services/takes.service.ts';
import { postTake } from '../../services/posting.service.ts';
import { type FrameFile, writeThumbnail } from '../../storage/takeFiles.ts';
import { setNoteStamp, setTakeStamp } from '../../services/stamps.service.ts';
import { pinNote, replyInThread } from '../../services/threads.service.ts';
import { drawStrip, PICTURE_HEIGHT, PICTURE_WIDTH } from './drawStrip.ts';
import type { DemoPersonKey } from './people.ts';
import { SHOT_TITLES, type Step, STORY } from './story.ts';
import { DEMO_STRIPS, type DemoStripId } from './strips.ts';

/** Who plays, by user id. */
export interface Cast {
  slug: string;
  people: Record<DemoPersonKey, string>;
}

export interface StoryDeps extends Deps {
  /** What `now` answers: set before each step. */
  clock: { now: Date };
  /** The present of the story, ms. */
  began: number;
  whenRead(takeId: string): Promise<void>;
}

interface Stage {
  deps: StoryDeps;
  cast: Cast;
  drawn: Map<DemoStripId, Promise<FrameFile[]>>;
  takes: Map<DemoStripId, string>;
  threads: Map<string, { id: string; notes: string[] }>;
}

const HOUR = 3_600_000;
const MINUTE = 60_000;

/** Plays every step in its order and at its time, each through the service that people use. */
export async function playStory(deps: StoryDeps, cast: Cast, folder: string): Promise<void> {
  const drawn = drawAhead(folder);
  const stage: Stage = { deps, cast, drawn, takes: new Map(), threads: new Map() };
  try {
    for (const step of STORY) {
      deps.clock.now = new Date(deps.began - step.ago * HOUR);
      await play(stage, step);
    }
  } finally {
    // What is still being drawn is written into a folder that is about to go.
    await Promise.allSettled(drawn.values());
  }
}

async function play(stage: Stage, step: Step): Promise<void> {
  const { deps, cast, takes, threads } = stage;
  const by = cast.people[step.by];
  switch (step.does) {
    case 'post':
      return post(stage, step, by);
    case 'pin': {
      const frame = step.frame - DEMO_STRIPS[step.take].firstFrame + 1;
      const thread = await pinNote(deps, by, takes.get(step.take)!, { frame, body: step.says });
      threads.set(step.thread, { id: thread.id, notes: [thread.notes[0]!.id] });
      return;
    }
    case 'reply': {
      const thread = threads.get(step.thread)!;
      thread.notes.push((await replyInThread(deps, by, thread.id, step.says)).id);
      return;
    }
    case 'stamp':
      if ('take' in step.on) await setTakeStamp(deps, by, takes.get(step.on.take)!, step.kind, true);
      else await setNoteStamp(deps, by, threads.get(step.on.thread)!.notes[step.on.note]!, step.kind, true);
      return;
    case 'decide':
      await decideTake(deps, by, takes.get(step.take)!, { state: step.state, remark: step.remark });
      return;
  }
}

async function post(
  { deps, cast, drawn, takes }: Stage,
  { take: id, changed, intended }: Extract<Step, { does: 'post' }>,
  by: string,
): Promise<void> {
  const strip = DEMO_STRIPS[id];
  const shotNumber = id.split('/')[0]!;
  const frames = await drawn.get(id)!;
  const take = await postTake(
    deps,
    by,
    cast.slug,
    { kind: 'frames', frames, width: PICTURE_WIDTH, height: PICTURE_HEIGHT },
    {
      shotNumber,
      shotTitle: SHOT_TITLES[shotNumber],
      fps: strip.fps,
      hold: strip.hold,
      firstFrame: strip.firstFrame,
      changed,
      intended,
    },
  );
  takes.set(id, take.id);
  deps.clock.now = new Date(deps.clock.now.getTime() + MINUTE);
  await deps.whenRead(take.id);
}

/** Draws the strips one after the other in the order of the story, while the takes before them are read. */
function drawAhead(folder: string): Map<DemoStripId, Promise<FrameFile[]>> {
  const drawn = new Map<DemoStripId, Promise<FrameFile[]>>();
  let before: Promise<unknown> = Promise.resolve();
  for (const step of STORY) {
    if (step.does !== 'post') continue;
    const id = step.take;
    const files = before.then(() => drawFrames(id, path.join(folder, id.replace('/', '-'))));
    // A failure is thrown where the strip is posted; until then it must not count as unhandled.
    files.catch(() => undefined);
    drawn.set(id, files);
    before = files;
  }
  return drawn;
}

async function drawFrames(id: DemoStripId, folder: string): Promise<FrameFile[]> {
  const { format } = DEMO_STRIPS[id];
  const frames: FrameFile[] = [];
  for (const file of await drawStrip(DEMO_STRIPS[id], folder)) {
    const thumbnail = `${file}.small`;
    await writeThumbnail(file, thumbnail);
    frames.push({ path: file, format, name: path.basename(file), thumbnail });
  }
  return frames;
}
