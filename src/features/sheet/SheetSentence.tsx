import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { Card } from '../../components/Card.tsx';
import { ThroughLine } from '../../components/ThroughLine.tsx';
import { summarise, summarySentences } from '../../lib/sheetSummary.ts';

/** A sentence before a chart: where the production stands, in words, and the drawing beside it. */
export function SheetSentence({ shots }: { shots: ShotWithTakes[] }) {
  const summary = summarise(shots);
  const back = summary.comesBack;
  return (
    <Card className="mb-3.5 grid items-center gap-x-7 gap-y-3 px-5 py-3.5 md:grid-cols-[minmax(0,1fr)_20rem]">
      <p className="font-display text-lg font-medium md:text-xl">
        {summarySentences(summary).join(' ')}
        {back && (
          <>
            {' '}
            What comes back most: “{back.title}”, {back.times === 2 ? 'twice' : `${back.times} times`}.
          </>
        )}
      </p>
      <ThroughLine steps={summary.steps} total={summary.total} className="w-full max-md:hidden" />
    </Card>
  );
}
