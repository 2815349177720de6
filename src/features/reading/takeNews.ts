import type { Sketch } from '../../../shared/api/takes.ts';

const SEVERITIES = ['minor', 'visible', 'strong'] as const;

type Found = Pick<Sketch['findings'][number], 'kind' | 'severity'>;

/**
 * What became of the findings of one take in the next, by kind: "1 mended, 1 smaller". Empty when there is nothing to say.
 */
export function takeNews(before: readonly Found[], after: readonly Found[]): string {
  const rest = [...after];
  const counts = { mended: 0, smaller: 0, larger: 0, left: 0 };
  for (const finding of before) {
    const index = rest.findIndex((one) => one.kind === finding.kind);
    const still = index === -1 ? undefined : rest.splice(index, 1)[0];
    if (!still) counts.mended += 1;
    else {
      const change = SEVERITIES.indexOf(still.severity) - SEVERITIES.indexOf(finding.severity);
      counts[change < 0 ? 'smaller' : change > 0 ? 'larger' : 'left'] += 1;
    }
  }
  const said = Object.entries(counts).flatMap(([word, count]) => (count > 0 ? [`${count} ${word}`] : []));
  if (rest.length > 0) said.push(`${rest.length} new`);
  return said.join(', ');
}
