import type { ShotWithTakes } from '../../shared/api/shots.ts';
import type { ReviewState, Take } from '../../shared/api/takes.ts';
import type { FindingKind } from '../../shared/reading/kinds.ts';

export interface SheetSummary {
  total: number;
  /** Cleared or waived. */
  through: number;
  waiting: number;
  anotherPass: number;
  /** The finding that sent takes back most often, by its title, and how often; null while none did twice. */
  comesBack: { title: string; times: number } | null;
  /** How many shots were through after each decision, first to last. */
  steps: { at: string; through: number }[];
}

/** Whether a shot in this state needs nobody any more. */
export const isThrough = (state: ReviewState | null) => state === 'cleared' || state === 'waived';

/** What a producer asks of a sheet first. Pure. */
export function summarise(shots: readonly ShotWithTakes[]): SheetSummary {
  const count = (state: ReviewState) => shots.filter((shot) => shot.state === state).length;
  return {
    total: shots.length,
    through: shots.filter((shot) => isThrough(shot.state)).length,
    waiting: count('waiting'),
    anotherPass: count('another-pass'),
    comesBack: comesBackMost(shots.flatMap((shot) => shot.takes)),
    steps: stepsOf(shots),
  };
}

/** Counted by kind: the same fault has more than one title. What came back once only is no pattern. */
function comesBackMost(takes: readonly Take[]): SheetSummary['comesBack'] {
  const counts = new Map<FindingKind, { title: string; times: number }>();
  for (const take of takes) {
    if (take.decision?.state !== 'another-pass') continue;
    const own = new Map(take.sketch?.findings.map((finding) => [finding.kind, finding.title]));
    for (const [kind, title] of own) counts.set(kind, { title, times: (counts.get(kind)?.times ?? 0) + 1 });
  }
  const most = [...counts.values()].sort((a, b) => b.times - a.times)[0];
  return most && most.times > 1 ? most : null;
}

function stepsOf(shots: readonly ShotWithTakes[]): SheetSummary['steps'] {
  const cleared = shots
    .filter((shot) => isThrough(shot.state))
    .flatMap((shot) => shot.takes.at(-1)?.decision?.decidedAt ?? [])
    .sort();
  return cleared.map((at, index) => ({ at, through: index + 1 }));
}

const NUMBERS = [
  'none',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];
const word = (count: number) => NUMBERS[count] ?? String(count);
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** The number that matters, in words, before any drawing of it. */
export function summarySentences({ total, through, waiting, anotherPass }: SheetSummary): string[] {
  if (total === 0) return ['No shots yet.'];
  const sentences = [
    through === total ? `All ${total} are through.` : `${through} of ${total} ${through === 1 ? 'is' : 'are'} through.`,
  ];
  if (waiting > 0 && anotherPass > 0) {
    sentences.push(
      `${capital(word(waiting))} ${waiting === 1 ? 'waits' : 'wait'} for a look, ${word(anotherPass)} went back for another pass.`,
    );
  } else if (waiting > 0) sentences.push(`${capital(word(waiting))} ${waiting === 1 ? 'waits' : 'wait'} for a look.`);
  else if (anotherPass > 0) sentences.push(`${capital(word(anotherPass))} went back for another pass.`);
  return sentences;
}

export interface SequenceRows {
  sequence: string;
  through: number;
  shots: ShotWithTakes[];
}

/** The rows of the sheet under their sequences, in the order of the sheet. */
export function bySequence(shots: readonly ShotWithTakes[]): SequenceRows[] {
  const groups = new Map<string, ShotWithTakes[]>();
  for (const shot of shots) groups.set(shot.sequence, [...(groups.get(shot.sequence) ?? []), shot]);
  return [...groups].map(([sequence, rows]) => ({
    sequence,
    shots: rows,
    through: rows.filter((shot) => isThrough(shot.state)).length,
  }));
}
