import { useQuery } from '@tanstack/react-query';
import { type LoaderFunctionArgs, Navigate, useParams } from 'react-router';
import { Button } from '../components/Button.tsx';
import { ErrorNote } from '../components/ErrorNote.tsx';
import { ApiProblem, sentenceOf } from '../lib/ApiProblem.ts';
import { paths } from '../lib/paths.ts';
import { shotOptions } from '../lib/queries/shots.ts';
import { takeOptions } from '../lib/queries/take.ts';
import { queryClientContext } from '../lib/routerContext.ts';
import { warm } from '../lib/warm.ts';
import { TakeDesk } from './take/TakeDesk.tsx';
import { TakeSkeleton } from './take/TakeSkeleton.tsx';

export function loader({ params, context }: LoaderFunctionArgs) {
  const client = context.get(queryClientContext);
  const { slug, shotNumber, n } = params as { slug: string; shotNumber: string; n: string };
  warm(client.query(takeOptions(slug, shotNumber, Number(n))), client.query(shotOptions(slug, shotNumber)));
  return null;
}

/** One take: its picture under the layers, the score, the reading in the margin, the notes that hang from their frames. */
export function TakePage() {
  const { slug, shotNumber, n } = useParams() as { slug: string; shotNumber: string; n: string };
  const takeNumber = Number(n);
  const take = useQuery(takeOptions(slug, shotNumber, takeNumber));
  const shot = useQuery(shotOptions(slug, shotNumber));

  // A refusal is an answer, and the route's own error screen has the words for it.
  if (take.error instanceof ApiProblem && take.error.status >= 400 && take.error.status < 500) throw take.error;
  if (take.error && !take.data) {
    return (
      <div className="mx-auto max-w-2xl px-3.5 py-10">
        <ErrorNote action={<Button onClick={() => void take.refetch()}>Try again</Button>}>
          <b className="block font-semibold">This take did not open</b>
          {sentenceOf(take.error)}
        </ErrorNote>
      </div>
    );
  }
  if (!take.data) return <TakeSkeleton />;
  if (take.data.shotNumber !== shotNumber || take.data.number !== takeNumber) {
    return <Navigate replace to={paths.take(slug, take.data.shotNumber, take.data.number)} />;
  }
  return <TakeDesk key={take.data.id} slug={slug} take={take.data} shot={shot.data ?? null} />;
}
