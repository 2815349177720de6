import type { Flight, ReadObject, Reading } from '../../../shared/reading/document.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { decimalsFor, shownNumber } from '../../lib/honestDigits.ts';
import { holdWords } from '../../lib/fpsWords.ts';
import { measureWords, shownIn } from './measureWords.ts';

/** 95 % of a normal distribution lie within this many standard errors. */
const Z95 = 1.96;

const estimate = (value: number, se: number, most: number) => {
  const decimals = decimalsFor(Z95 * se, most);
  const half = shownNumber(Z95 * se, decimals);
  return `${shownNumber(value, decimals)} ± ${Number(half) === 0 ? `< ${shownNumber(10 ** -decimals, decimals)}` : half}`;
};

function rowsOf(flight: Flight, object: ReadObject, reading: Reading): [string, string][] {
  const { source, camera, engine } = reading;
  const seen = object.marks.filter(
    (mark) => mark.frame >= (flight.takeOff ?? 1) - 0.5 && mark.frame <= (flight.landing ?? source.frames) + 0.5,
  ).length;
  const { metric } = flight.gravity;
  return [
    ['Drawings', `${seen} frames marked, ${holdWords(source.hold)}`],
    [
      'Take-off',
      flight.takeOff === null ? 'before the strip' : shownNumber(shownFrame(flight.takeOff, source.firstFrame), 2),
    ],
    [
      'Landing',
      flight.landing === null ? 'after the strip' : shownNumber(shownFrame(flight.landing, source.firstFrame), 2),
    ],
    ...(flight.apex
      ? ([
          [
            'Apex as drawn',
            `frame ${estimate(shownFrame(flight.apex.frame, source.firstFrame), flight.apex.seFrame, 2)}`,
          ],
          ['Apex height', `y ${estimate(flight.apex.y, flight.apex.seY, 1)} px`],
        ] as [string, string][])
      : []),
    ['Across', `${estimate(flight.across.value, flight.across.se, 2)} px/f`],
    ['Gravity', `${estimate(flight.gravity.value, flight.gravity.se, 3)} px/f²`],
    ...(metric ? ([['Gravity, to scale', `${estimate(metric.value, metric.se, 2)} m/s²`]] as [string, string][]) : []),
    ['Scatter left over', `${shownNumber(flight.residual, 2)} px an axis`],
    ['Path', flight.model === 'depth' ? 'towards or away from the camera' : 'flat to the camera'],
    ['Camera', camera.moved ? 'moved; its move was taken out' : 'still'],
    ['Engine', engine],
  ];
}

/** The statistics behind a flight's card: what was fitted, and how sure it is. */
export function HowRead({ flight, object, reading }: { flight: Flight; object: ReadObject; reading: Reading }) {
  return (
    <details className="mt-1.5 text-xs">
      <summary className="inline-block py-0.5 text-graphite underline underline-offset-2 hover:text-ink touch:py-3.5">
        How this was read
      </summary>
      <p className="mt-1.5 text-graphite">
        A parabola was fitted to the marks by least squares. A measure is off when its whole interval lies outside the
        tolerance, true when it lies inside; else nobody can tell. Intervals hold 95 %.
      </p>
      <dl className="mt-1.5 grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 gap-y-0.5">
        {rowsOf(flight, object, reading).map(([name, value]) => (
          <div key={name} className="contents">
            <dt className="text-graphite">{name}</dt>
            <dd className="text-right font-mono">{value}</dd>
          </div>
        ))}
        {flight.measures
          .filter((measure) => measure.name !== 'gravity')
          .map((measure) => {
            const half = (measure.high - measure.low) / 2;
            return (
              <div key={measure.name} className="contents">
                <dt className="text-graphite">{measureWords(measure.name)}</dt>
                <dd className="text-right font-mono">
                  {shownIn(measure.name, measure.low, half)} … {shownIn(measure.name, measure.high, half)}
                </dd>
              </div>
            );
          })}
      </dl>
    </details>
  );
}
