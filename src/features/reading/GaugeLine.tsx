import clsx from 'clsx';
import type { Measure } from '../../../shared/reading/document.ts';
import { gaugeOf, type GaugeRow, shownIn, shownValue } from './measureWords.ts';

const VERDICTS: Record<Measure['verdict'], string> = { off: 'off', true: 'true', 'cannot-tell': 'cannot tell' };

const percent = (share: number) => `${(share * 100).toFixed(2)}%`;

function Drawing({ measure }: { measure: Measure }) {
  const gauge = gaugeOf(measure);
  if (!gauge) return <span />;
  const look = {
    off: 'bg-redline',
    true: 'bg-blue',
    'cannot-tell': 'border border-graphite bg-sheet',
  }[measure.verdict];
  return (
    <span className="relative block h-4" aria-hidden="true">
      <span className="absolute inset-x-0 top-[7px] h-0.5 bg-well" />
      <span
        className="absolute top-[3px] h-2.5 rounded-[3px] border border-blueline bg-bluewash"
        style={{ left: percent(gauge.band[0]), width: percent(gauge.band[1] - gauge.band[0]) }}
      />
      <span
        className={clsx(
          'absolute top-[6.5px] h-[3px] rounded-full',
          measure.verdict === 'off' ? 'bg-redline/45' : measure.verdict === 'true' ? 'bg-blue/45' : 'hatched',
        )}
        style={{ left: percent(gauge.interval[0]), width: percent(gauge.interval[1] - gauge.interval[0]) }}
      />
      {gauge.beyond ? (
        <svg
          viewBox="0 0 8 14"
          className="absolute top-px h-3.5 w-2 -translate-x-1/2"
          style={{ left: percent(gauge.marker) }}
        >
          <path d={gauge.marker > 0.5 ? 'M1 1l6 6-6 6z' : 'M7 1L1 7l6 6z'} className="fill-redline" />
        </svg>
      ) : (
        <span
          className={clsx(
            'absolute top-px h-3.5 -translate-x-1/2 rounded-[2px]',
            look,
            measure.verdict === 'cannot-tell' ? 'w-[7px]' : 'w-[3px]',
          )}
          style={{ left: percent(gauge.marker) }}
        />
      )}
    </span>
  );
}

function Expected({ measure }: { measure: Measure }) {
  if (measure.expected === null || measure.tolerance === null) return null;
  const half = (measure.high - measure.low) / 2;
  return (
    <span className="sr-only">
      , should be {shownIn(measure.name, measure.expected, half)}, {VERDICTS[measure.verdict]}
    </span>
  );
}

/** One measure in plain words: the tolerance as a blue band, its interval and marker, the value with its unit. */
export function GaugeLine({ words, measure }: GaugeRow) {
  const value = shownValue(measure);
  const [number, unit] = value.split(/ (?=px)/);
  return (
    <div className="grid grid-cols-[7.2rem_minmax(0,1fr)_auto] items-center gap-2.5 py-[3px] text-sm">
      <dt className="truncate text-graphite">{words}</dt>
      <dd className="contents">
        <Drawing measure={measure} />
        <span
          className={clsx('min-w-16 text-right font-mono font-semibold', measure.verdict === 'off' && 'text-red')}
          title={
            measure.verdict === 'cannot-tell'
              ? 'Cannot tell: the interval reaches over the edge of the tolerance'
              : undefined
          }
        >
          {measure.verdict === 'cannot-tell' && <span className="font-normal text-graphite">≈ </span>}
          {number}
          {unit && <span className="text-xs font-medium"> {unit}</span>}
          <Expected measure={measure} />
        </span>
      </dd>
    </div>
  );
}
