import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { Button, buttonClass } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { Loading } from '../../components/Loading.tsx';
import { Skeleton } from '../../components/Skeleton.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { paths } from '../../lib/paths.ts';
import { sheetOptions } from '../../lib/queries/shots.ts';
import { bySequence } from '../../lib/sheetSummary.ts';
import { useMediaQuery } from '../../lib/useMediaQuery.ts';
import { SheetList } from './SheetList.tsx';
import { SheetSentence } from './SheetSentence.tsx';
import { SheetTable } from './SheetTable.tsx';

/** Every shot of the production with its take trail and where it stands; live. */
export function ShotSheet({ slug }: { slug: string }) {
  const sheet = useQuery(sheetOptions(slug));
  const narrow = useMediaQuery('(max-width: 59.99rem)');

  if (sheet.isPending) return <SheetSkeleton />;
  if (!sheet.data) {
    return (
      <ErrorNote action={<Button onClick={() => void sheet.refetch()}>Try again</Button>}>
        {sentenceOf(sheet.error)}
      </ErrorNote>
    );
  }
  const { shots } = sheet.data;
  if (shots.length === 0) {
    return (
      <EmptyState
        title="The sheet is blank"
        action={
          <Link to={paths.post(slug)} className={buttonClass('primary')}>
            Post a strip
          </Link>
        }
      >
        Every shot with something in the air gets a row here: its takes as small arcs, who draws it, who looks at it,
        what is still off. The first strip that is posted starts it.
      </EmptyState>
    );
  }
  const groups = bySequence(shots);
  return (
    <>
      <SheetSentence shots={shots} />
      {narrow ? <SheetList slug={slug} groups={groups} /> : <SheetTable slug={slug} groups={groups} />}
    </>
  );
}

function SheetSkeleton() {
  return (
    <Loading what="Fetching the shot sheet">
      <Skeleton className="mb-3.5 h-20 rounded-card" />
      <div className="rounded-card border border-rule bg-sheet">
        {['1', '2', '3', '4', '5', '6'].map((row) => (
          <div key={row} className="flex items-center gap-6 border-b border-rule px-3.5 py-3 last:border-0">
            <Skeleton className="h-9 w-40" />
            <Skeleton className="h-9 flex-1" />
            <Skeleton className="h-5.5 w-24 rounded-full" />
          </div>
        ))}
      </div>
    </Loading>
  );
}
