import { Loading } from '../../components/Loading.tsx';
import { Skeleton } from '../../components/Skeleton.tsx';
import { DESK, GRID, STAGE } from './layout.ts';

/** The shape of a take page while it is on its way. */
export function TakeSkeleton() {
  return (
    <Loading what="Opening the take" className={DESK}>
      <div className="mb-3 flex items-center gap-3.5 max-md:px-3.5">
        <Skeleton className="h-4 w-16" />
        <Skeleton className="h-7 w-72 max-w-full" />
        <Skeleton className="h-5.5 w-24 rounded-full" />
      </div>
      <div className={GRID}>
        <div className="order-2 space-y-3 max-lg:px-3.5 lg:order-1">
          <Skeleton className="h-56 rounded-card" />
          <Skeleton className="h-44 rounded-card" />
        </div>
        <div className="order-1 lg:order-2">
          <Skeleton className="h-10 rounded-none rounded-t-card" />
          <div className={`${STAGE} bg-surround`} />
          {['strip', 'across', 'up', 'findings', 'notes'].map((lane) => (
            <Skeleton key={lane} className="mt-px h-11 rounded-none" />
          ))}
        </div>
      </div>
    </Loading>
  );
}
