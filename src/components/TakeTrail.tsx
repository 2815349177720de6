import clsx from 'clsx';
import { Link } from 'react-router';
import type { Sketch, Take } from '../../shared/api/takes.ts';
import { mainObject } from '../lib/sketchSpacing.ts';
import { FlightGlyph } from './FlightGlyph.tsx';
import { STATE_INK, STATE_WORDS } from './StateChip.tsx';

const WIDTH = 48;
const HEIGHT = 30;
const PAD = 3;

export interface TakeTrailProps {
  takes: Take[];
  /** The address of a take. */
  hrefOf: (take: Take) => string;
  className?: string;
}

/** One small arc for each take, drawn as it was measured, under the glyph of what became of it: a shot coming right. */
export function TakeTrail({ takes, hrefOf, className }: TakeTrailProps) {
  return (
    <ol className={clsx('flex flex-wrap items-end gap-x-1 gap-y-2', className)}>
      {takes.map((take, index) => (
        <li key={take.id} className="flex items-center gap-1">
          {index > 0 && <span className="h-px w-1.5 bg-graphite opacity-50" aria-hidden="true" />}
          <Link
            to={hrefOf(take)}
            title={wordsOf(take)}
            aria-label={wordsOf(take)}
            className="flex min-w-11 flex-col items-center rounded-control px-0.5 pt-1 no-underline hover:bg-well touch:min-h-11"
          >
            <FlightGlyph state={take.review} className={STATE_INK[take.review]} />
            <SmallArc sketch={take.sketch} />
          </Link>
        </li>
      ))}
    </ol>
  );
}

function wordsOf(take: Take): string {
  const findings = take.sketch?.findings.length ?? 0;
  const read = take.sketch
    ? findings === 0
      ? 'no findings'
      : `${findings} finding${findings === 1 ? '' : 's'}`
    : 'not read';
  return `Take ${take.number}: ${STATE_WORDS[take.review].toLowerCase()}, ${read}`;
}

/** The path of the main thing of a take in a small field, both directions at one scale. */
function SmallArc({ sketch }: { sketch: Sketch | null }) {
  const object = sketch && mainObject(sketch);
  const marks = sketch?.marks.filter((mark) => mark.object === object).sort((a, b) => a.frame - b.frame) ?? [];
  if (marks.length < 2) {
    return (
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="h-7.5 w-12 text-graphite" aria-hidden="true">
        <path d={`M${PAD} ${HEIGHT - PAD}H${WIDTH - PAD}`} className="pencil" strokeDasharray="2 4" />
      </svg>
    );
  }
  const left = Math.min(...marks.map((mark) => mark.x));
  const right = Math.max(...marks.map((mark) => mark.x));
  const top = Math.min(...marks.map((mark) => mark.y));
  const bottom = Math.max(...marks.map((mark) => mark.y));
  const scale = Math.min((WIDTH - 2 * PAD) / Math.max(1, right - left), (HEIGHT - 2 * PAD) / Math.max(1, bottom - top));
  const x = (value: number) => WIDTH / 2 + (value - (left + right) / 2) * scale;
  const y = (value: number) => HEIGHT - PAD - (bottom - value) * scale;
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="h-7.5 w-12 text-ink" aria-hidden="true">
      <path
        d={`M${marks.map((mark) => `${x(mark.x).toFixed(1)} ${y(mark.y).toFixed(1)}`).join('L')}`}
        className="pencil"
        strokeWidth="1.6"
      />
    </svg>
  );
}
