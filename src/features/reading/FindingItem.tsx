import clsx from 'clsx';
import { shownFrame } from '../../../shared/reading/document.ts';
import type { Severity } from '../../../shared/reading/kinds.ts';
import { Button } from '../../components/Button.tsx';
import { FindingNumber } from '../../components/FindingNumber.tsx';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { TimingChart } from './TimingChart.tsx';

const SEVERITY_WORDS: Record<Severity, string> = { minor: 'slight', visible: 'clear', strong: 'strong' };

interface FindingItemProps {
  finding: NumberedFinding;
  firstFrame: number;
  chosen: boolean;
  mendShown: boolean;
  onChoose: () => void;
  onShowMend: (shown: boolean) => void;
}

/** One finding: what is off, by how much, on which frames, and the mend on demand. */
export function FindingItem({ finding, firstFrame, chosen, mendShown, onChoose, onShowMend }: FindingItemProps) {
  const from = shownFrame(finding.fromFrame, firstFrame);
  const to = shownFrame(finding.toFrame, firstFrame);
  return (
    <li className="grid grid-cols-[20px_minmax(0,1fr)] gap-2 border-t border-rule py-2 first:border-t-0 first:pt-1 last:pb-0">
      <FindingNumber number={finding.number} className="mt-0.5" />
      <div>
        <h3 className="text-base">
          <button
            type="button"
            aria-pressed={chosen}
            onClick={onChoose}
            className={clsx(
              'relative text-left font-sans font-semibold hover:underline touch:before:absolute touch:before:-inset-x-2 touch:before:-inset-y-3',
              chosen && 'underline decoration-redline decoration-2 underline-offset-3',
            )}
          >
            {finding.title}
          </button>{' '}
          <span className="font-sans text-xs font-normal whitespace-nowrap text-graphite">
            · {SEVERITY_WORDS[finding.severity]}
          </span>
        </h3>
        <p className="mt-px text-sm text-graphite">{finding.detail}</p>
        <div className="mt-1.5 flex flex-wrap items-center gap-2">
          {finding.mend.length > 0 && (
            <Button size="small" aria-pressed={mendShown} onClick={() => onShowMend(!mendShown)}>
              {mendShown ? 'Hide the mend' : 'Show the mend'}
            </Button>
          )}
          <span className="font-mono text-2xs text-graphite">{from === to ? from : `${from} – ${to}`}</span>
        </div>
        {mendShown && (
          <div className="mt-2 space-y-1.5">
            {finding.chart.map((chart) => (
              <TimingChart key={`${chart.from}-${chart.to}`} chart={chart} firstFrame={firstFrame} />
            ))}
            <p className="text-xs text-graphite">
              Step through the frames: the blue arrow says where each of the {finding.mend.length} drawings goes.
            </p>
          </div>
        )}
      </div>
    </li>
  );
}
