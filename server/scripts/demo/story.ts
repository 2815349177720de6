import type { StampKind } from '../../../shared/api/stamps.ts';
import type { Decision } from '../../../shared/api/takes.ts';
import type { DemoPersonKey } from './people.ts';
import { FIRST_DAYS } from './storyFirstDays.ts';
import { LAST_DAYS } from './storyLastDays.ts';
import type { DemoStripId } from './strips.ts';

/** What happened in the demo production: each step once, oldest first. `ago` is hours before the seed runs. */
export type Step = { ago: number; by: DemoPersonKey } & (
  | { does: 'post'; take: DemoStripId; changed: string; intended: string }
  /** `frame` is the production's number, as a person would say it. */
  | { does: 'pin'; take: DemoStripId; thread: string; frame: number; says: string }
  | { does: 'reply'; thread: string; says: string }
  | { does: 'stamp'; on: { take: DemoStripId } | { thread: string; note: number }; kind: StampKind }
  | { does: 'decide'; take: DemoStripId; state: Decision['state']; remark: string }
);

export const SHOT_TITLES: Record<string, string> = {
  '010-0020': 'Dough ball into the trough',
  '010-0040': 'Rolling pin, once around',
  '010-0060': 'Egg across the kitchen',
  '020-0030': 'First bun to the ferry',
  '020-0050': 'A roll gets away',
  '020-0090': 'Cork float down the slip',
  '030-0010': 'Flour sack to the raft',
  '030-0070': 'Boot out of the mud',
  '030-0120': 'The hat that stays up',
  '040-0020': 'An orange for the ferryman',
  '040-0080': 'Last loaf over the rail',
};
export const STORY: Step[] = [...FIRST_DAYS, ...LAST_DAYS];
