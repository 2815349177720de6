import { BrandMark } from '../components/BrandMark.tsx';
import { Loading } from '../components/Loading.tsx';
import { Skeleton } from '../components/Skeleton.tsx';

/** The shape of a screen while the first data is on its way. */
export function FirstLoad() {
  return (
    <Loading what="Opening Spandrel">
      <div className="flex h-12.5 items-center gap-2 border-b border-rule bg-sheet px-3.5 lg:px-7">
        <BrandMark />
        <Skeleton className="ml-4 h-5 w-32" />
      </div>
      <div className="mx-auto max-w-[90rem] space-y-4 px-3.5 py-4 lg:px-7">
        <Skeleton className="h-7 w-48" />
        <Skeleton className="h-64 rounded-card" />
      </div>
    </Loading>
  );
}
