import { type LoaderFunctionArgs, useParams } from 'react-router';
import { PageHead } from '../components/PageHead.tsx';
import { PostStrip } from '../features/posting/PostStrip.tsx';
import { sheetOptions } from '../lib/queries/shots.ts';
import { queryClientContext } from '../lib/routerContext.ts';
import { warm } from '../lib/warm.ts';

export function loader({ params, context }: LoaderFunctionArgs) {
  warm(context.get(queryClientContext).query(sheetOptions(params.slug!)));
  return null;
}

export function PostPage() {
  const slug = useParams().slug!;
  return (
    <div className="mx-auto max-w-[90rem] px-3.5 py-3.5 lg:px-7">
      <PageHead title="Post a strip">
        <span className="text-graphite">nobody sees it until you post it</span>
      </PageHead>
      <PostStrip slug={slug} />
    </div>
  );
}
