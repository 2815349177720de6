import { useQuery } from '@tanstack/react-query';
import { type LoaderFunctionArgs, useParams } from 'react-router';
import { PageHead } from '../components/PageHead.tsx';
import { ShotSheet } from '../features/sheet/ShotSheet.tsx';
import { sheetOptions } from '../lib/queries/shots.ts';
import { queryClientContext } from '../lib/routerContext.ts';
import { warm } from '../lib/warm.ts';

export function loader({ params, context }: LoaderFunctionArgs) {
  warm(context.get(queryClientContext).query(sheetOptions(params.slug!)));
  return null;
}

export function SheetPage() {
  const slug = useParams().slug!;
  const { data } = useQuery(sheetOptions(slug));
  const count = data?.shots.length ?? 0;
  return (
    <div className="mx-auto max-w-[90rem] px-3.5 py-3.5 lg:px-7">
      <PageHead title="Shot sheet">
        {count > 0 && (
          <span className="text-graphite">
            {count} shot{count === 1 ? '' : 's'} with something in the air
          </span>
        )}
      </PageHead>
      <ShotSheet slug={slug} />
    </div>
  );
}
