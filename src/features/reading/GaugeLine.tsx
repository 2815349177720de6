import clsx from 'clsx';
import type { Measure } from '../../../shared/reading/document.ts';
import { gaugeOf, type GaugeRow, shownIn, shownValue } from './measureWords.ts';

/** `called`: a finding says so. Red is for findings; what only lies outside its tolerance is ink. */
type Look = 'called' | 'outside' | 'true' | 'cannot-tell';

const LOOKS: Record<Look, { marker: string; interval: string; arrow: string; words: string }> = {
  called: { marker: 'w-[3px] bg-redline', interval: 'bg-redline/45', arrow: 'fill-redline', words: 'off' },
  outside: { marker: 'w-[3px] bg-ink', interval: 'bg-ink/40', arrow: 'fill-ink', words: 'outside the tolerance' },
  true: { marker: 'w-[3px] bg-blue', interval: 'bg-blue/45', arrow: 'fill-blue', words: 'true' },
  'cannot-tell': {
    marker: 'w-[7px] border border-graphite bg-sheet',
    interval: 'hatched',
    arrow: 'fill-graphite',
    words: 'cannot tell',
  },
};

const percent = (share: number) => `${(share * 100).toFixed(2)}%`;

function Drawing({ measure, look }: { measure: Measure; look: Look }) {
  const gauge = gaugeOf(measure);
  if (!gauge) return <span />;
  const { marker, interval, arrow } = LOOKS[look];
  return (
    <span className="relative block h-4" aria-hidden="true">
      <span className="absolute inset-x-0 top-[7px] h-0.5 bg-well" />
      <span
        className="absolute top-[3px] h-2.5 rounded-[3px] border border-blueline bg-bluewash"
        style={{ left: percent(gauge.band[0]), width: percent(gauge.band[1] - gauge.band[0]) }}
      />
      <span
        className={clsx('absolute top-[6.5px] h-[3px] rounded-full', interval)}
        style={{ left: percent(gauge.interval[0]), width: percent(gauge.interval[1] - gauge.interval[0]) }}
      />
      {gauge.beyond ? (
        <svg
          viewBox="0 0 8 14"
          className="absolute top-px h-3.5 w-2 -translate-x-1/2"
          style={{ left: percent(gauge.marker) }}
        >
          <path d={gauge.marker > 0.5 ? 'M1 1l6 6-6 6z' : 'M7 1L1 7l6 6z'} className={arrow} />
        </svg>
      ) : (
        <span
          className={clsx('absolute top-px h-3.5 -translate-x-1/2 rounded-[2px]', marker)}
          style={{ left: percent(gauge.marker) }}
        />
      )}
    </span>
  );
}

function Expected({ measure, look }: { measure: Measure; look: Look }) {
  if (measure.expected === null || measure.tolerance === null) return null;
  const half = (measure.high - measure.low) / 2;
  return (
    <span className="sr-only">
      , should be {shownIn(measure.name, measure.expected, half)}, {LOOKS[look].words}
    </span>
  );
}

interface GaugeLineProps extends GaugeRow {
  /** A finding on this flight speaks of it. */
  called: boolean;
}

/** One measure in plain words: the tolerance as a blue band, its interval and marker, the value with its unit. */
export function GaugeLine({ words, measure, called }: GaugeLineProps) {
  const look: Look = measure.verdict === 'off' ? (called ? 'called' : 'outside') : measure.verdict;
  const [number, unit] = shownValue(measure).split(/ (?=px)/);
  return (
    <div className="grid grid-cols-[7.2rem_minmax(0,1fr)_auto] items-center gap-2.5 py-[3px] text-sm">
      <dt className="truncate text-graphite">{words}</dt>
      <dd className="contents">
        <Drawing measure={measure} look={look} />
        <span
          className={clsx('min-w-16 text-right font-mono font-semibold', look === 'called' && 'text-red')}
          title={
            look === 'cannot-tell' ? 'Cannot tell: the interval reaches over the edge of the tolerance' : undefined
          }
        >
          {look === 'cannot-tell' && <span className="font-normal text-graphite">≈ </span>}
          {number}
          {unit && <span className="text-xs font-medium"> {unit}</span>}
          <Expected measure={measure} look={look} />
        </span>
      </dd>
    </div>
  );
}
