import { useQuery } from '@tanstack/react-query';
import clsx from 'clsx';
import type { Take } from '../../../shared/api/takes.ts';
import { FindingNumber } from '../../components/FindingNumber.tsx';
import { ProgressCount } from '../../components/ProgressCount.tsx';
import { SketchLane } from '../../components/SketchLane.tsx';
import { OUTCOME_WORDS } from '../../lib/outcomeWords.ts';
import { progressOptions } from '../../lib/queries/take.ts';

const SHOWN = 4;

/** What the reading says of a take, in the margin of its card: findings by number, or how far it is. */
export function CardReading({ take, className }: { take: Take; className?: string }) {
  const sketch = take.sketch;
  return (
    <div className={clsx('text-sm', className)}>
      <ReadingWord take={take} />
      {sketch && take.reading.status === 'read' && (
        <>
          {sketch.findings.length > 0 && (
            <ol className="space-y-1.5">
              {sketch.findings.slice(0, SHOWN).map((finding, index) => (
                <li key={finding.id} className="flex items-center gap-2 font-semibold">
                  <FindingNumber number={index + 1} />
                  {finding.title}
                </li>
              ))}
              {sketch.findings.length > SHOWN && (
                <li className="pl-6.5 text-graphite">and {sketch.findings.length - SHOWN} more</li>
              )}
            </ol>
          )}
          <SketchLane sketch={sketch} className="mt-2" />
        </>
      )}
    </div>
  );
}

function ReadingWord({ take }: { take: Take }) {
  const { data: progress } = useQuery(progressOptions(take.id));
  if (take.reading.status === 'failed') {
    return (
      <>
        <p className="font-semibold">Could not be read</p>
        <p className="mt-1 text-graphite">{take.reading.message ?? 'Open the take to read it again.'}</p>
      </>
    );
  }
  if (take.reading.status !== 'read') {
    return progress ? (
      <ProgressCount label={PHASES[progress.phase]} done={progress.done} total={progress.total} unit="frames" />
    ) : (
      <>
        <p className="font-semibold">Waiting to be read</p>
        <p className="mt-1 text-graphite">{take.frames} frames</p>
      </>
    );
  }
  const sketch = take.sketch;
  if (!sketch || sketch.findings.length > 0) return null;
  const isTrue = sketch.outcome === 'read';
  return (
    <p className={clsx('flex items-center gap-2 font-semibold', isTrue && 'text-green')}>
      {OUTCOME_WORDS[sketch.outcome]}
    </p>
  );
}

const PHASES = { decoding: 'Opening the frames', finding: 'Finding the thing', reading: 'Reading the flight' } as const;
