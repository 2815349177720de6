import { Loading } from '../../components/Loading.tsx';
import { Skeleton } from '../../components/Skeleton.tsx';

/** Two cards in outline. */
export function FeedSkeleton() {
  return (
    <Loading what="Fetching the feed">
      {['first', 'second'].map((card) => (
        <div key={card} className="mb-4.5 overflow-hidden rounded-card border border-rule bg-sheet">
          <div className="flex items-center gap-3 px-4.5 py-3">
            <Skeleton className="h-6 w-7 rounded-full" />
            <div className="flex-1 space-y-1.5">
              <Skeleton className="h-3.5 w-32" />
              <Skeleton className="h-4.5 w-64 max-w-full" />
            </div>
            <Skeleton className="h-5.5 w-24 rounded-full" />
          </div>
          <div className="grid border-t border-rule md:grid-cols-[16.875rem_minmax(0,1fr)]">
            <div className="space-y-2 p-4.5">
              <Skeleton className="h-4.5 w-40" />
              <Skeleton className="h-20 w-full" />
            </div>
            <Skeleton className="h-64 rounded-none" />
          </div>
        </div>
      ))}
    </Loading>
  );
}
