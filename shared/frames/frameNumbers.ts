/** The frame numbers that a set of file names carries. */
export interface FrameNumbers {
  /** The number of each name in the order given; null where it has none. */
  numbers: (number | null)[];
  /** The lowest number, when every name has one and no two have the same. */
  firstFrame: number | null;
  /** Numbers between the lowest and the highest that no name has, as the production counts. */
  missing: number[];
  /** Numbers that more than one name has. */
  repeated: number[];
}

/** More missing numbers than this are no gap: the digits count something else, such as the time of day. */
const MOST_MISSING = 1000;

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** Natural order of file names: frame 9 stands before frame 10, whatever the padding. Never 0 for different names. */
export function byName(a: string, b: string): number {
  return collator.compare(a, b) || (a < b ? -1 : a > b ? 1 : 0);
}

/**
 * Reads frame numbers from file names: the last group of digits that is not the same in every name, so that
 * `toss.1001.v2.png` and `toss.1002.v2.png` are 1001 and 1002. Names of another pattern than most have no number.
 * A single name counts by its last group.
 */
export function readFrameNumbers(names: string[]): FrameNumbers {
  const patterns = names.map(patternOf);
  const common = mostCommon(patterns.map(({ text }) => text));
  const members = patterns.filter(({ text }) => text === common);
  const group = lastVaryingGroup(members.map(({ digits }) => digits));
  const numbers = patterns.map(({ text, digits }) => {
    const value = text === common && group >= 0 ? Number(digits[group]) : Number.NaN;
    return Number.isSafeInteger(value) ? value : null;
  });

  const counted = numbers.filter((number) => number !== null).sort((a, b) => a - b);
  const repeated = [...new Set(counted.filter((number, index) => number === counted[index - 1]))];
  const nothing = { numbers, firstFrame: null, missing: [], repeated };
  if (counted.length === 0 || counted.length < names.length || repeated.length > 0) return nothing;
  const first = counted[0]!;
  const span = counted.at(-1)! - first + 1;
  if (span - counted.length > MOST_MISSING) return { ...nothing, numbers: names.map(() => null) };
  const there = new Set(counted);
  const missing = Array.from({ length: span }, (_, index) => first + index).filter((number) => !there.has(number));
  return { numbers, firstFrame: first, missing, repeated };
}

/** Numbers as a person says them: `1003, 1007–1010`. */
export function sayNumbers(numbers: number[]): string {
  const runs: { from: number; to: number }[] = [];
  for (const number of numbers) {
    const run = runs.at(-1);
    if (run && number === run.to + 1) run.to = number;
    else runs.push({ from: number, to: number });
  }
  return runs.map(({ from, to }) => (from === to ? `${from}` : `${from}–${to}`)).join(', ');
}

interface Pattern {
  /** The name with every group of digits replaced. */
  text: string;
  digits: string[];
}

function patternOf(name: string): Pattern {
  // The ending may hold a digit of its own, such as .jp2.
  const stem = name.replace(/\.[A-Za-z][A-Za-z0-9]*$/, '');
  return { text: stem.replaceAll(/\d+/g, '#'), digits: stem.match(/\d+/g) ?? [] };
}

function mostCommon(texts: string[]): string | undefined {
  const counts = new Map<string, number>();
  for (const text of texts) counts.set(text, (counts.get(text) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0];
}

function lastVaryingGroup(digits: string[][]): number {
  const groups = digits[0]?.length ?? 0;
  if (digits.length === 1) return groups - 1;
  for (let group = groups - 1; group >= 0; group -= 1) {
    if (digits.some((each) => Number(each[group]) !== Number(digits[0]![group]))) return group;
  }
  return groups - 1;
}
