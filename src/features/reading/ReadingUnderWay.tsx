import { useQuery } from '@tanstack/react-query';
import type { ReadingProgress, Take } from '../../../shared/api/takes.ts';
import { Card } from '../../components/Card.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { Loading } from '../../components/Loading.tsx';
import { ProgressCount } from '../../components/ProgressCount.tsx';
import { Skeleton } from '../../components/Skeleton.tsx';
import { progressOptions } from '../../lib/queries/take.ts';
import { ReadAgain } from './ReadAgain.tsx';

const PHASES: Record<ReadingProgress['phase'], string> = {
  decoding: 'Opening the frames',
  finding: 'Finding the thing',
  reading: 'Reading the flight',
};

/** The margin while there is no reading: how far it is, why there will be none, or its shape while it is fetched. */
export function ReadingUnderWay({ take, slug }: { take: Take; slug: string }) {
  const { data: progress } = useQuery(progressOptions(take.id));
  if (take.reading.status === 'failed') {
    return (
      <ErrorNote action={<ReadAgain slug={slug} takeId={take.id} size="small" />}>
        <b className="block font-semibold">This take could not be read</b>
        {take.reading.message ?? 'The reading stopped. The frames are safe; read it again.'}
      </ErrorNote>
    );
  }
  const onItsWay = take.reading.status === 'read';
  return (
    <Card className="px-4 py-3">
      <h2 className="mb-2 text-md">
        {take.reading.status === 'queued' && !progress ? 'Waiting to be read' : 'Reading'}
      </h2>
      <Loading what={onItsWay ? 'The reading is being fetched' : 'The reading is under way'}>
        {!onItsWay && (
          <ProgressCount
            label={progress ? PHASES[progress.phase] : 'In line'}
            done={progress?.done ?? 0}
            total={progress?.total ?? take.frames}
            unit="frames"
          />
        )}
        <div className="mt-4 space-y-2.5">
          {[0, 1, 2, 3, 4].map((row) => (
            <div key={row} className="flex gap-3">
              <Skeleton className="h-3.5 w-24" />
              <Skeleton className="h-3.5 flex-1" />
              <Skeleton className="h-3.5 w-12" />
            </div>
          ))}
        </div>
      </Loading>
      <p className="mt-3 text-sm text-graphite">The picture and the notes work meanwhile.</p>
    </Card>
  );
}
