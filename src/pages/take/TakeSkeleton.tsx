import { Card } from '../../components/Card.tsx';
import { Loading } from '../../components/Loading.tsx';
import { Skeleton } from '../../components/Skeleton.tsx';
import { DESK, GRID, STAGE } from './layout.ts';

const LANES = [
  { name: 'strip', height: 54 },
  { name: 'across', height: 54 },
  { name: 'up', height: 86 },
  { name: 'findings', height: 29 },
  { name: 'notes', height: 28 },
];

/** The shape of a take page while it is on its way. */
export function TakeSkeleton() {
  return (
    <Loading what="Opening the take" className={DESK}>
      <div className="mb-3 flex h-9 items-center gap-3.5 max-md:px-3.5">
        <Skeleton className="h-4 w-16" />
        <Skeleton className="h-6 w-72 max-w-[50%]" />
        <Skeleton className="h-5.5 w-24 rounded-full" />
      </div>
      <div className={GRID}>
        <div className="order-2 space-y-3 max-lg:px-3.5 lg:order-1">
          {[6, 4].map((rows) => (
            <Card key={rows} className="space-y-3 px-4 py-4">
              <Skeleton className="h-4.5 w-32" />
              {Array.from({ length: rows }, (_, row) => (
                <div key={`row ${row + 1}`} className="flex gap-3">
                  <Skeleton className="h-3.5 w-24" />
                  <Skeleton className="h-3.5 flex-1" />
                  <Skeleton className="h-3.5 w-12" />
                </div>
              ))}
            </Card>
          ))}
        </div>
        <div className="order-1 min-w-0 lg:order-2">
          <div className="overflow-hidden rounded-card border border-rule bg-sheet max-md:rounded-none max-md:border-x-0">
            <div className="flex h-10 items-center gap-2 border-b border-dashed border-rule px-3">
              {['marks', 'arc', 'findings', 'ladders'].map((layer) => (
                <Skeleton key={layer} className="h-6 w-20" />
              ))}
            </div>
            <div className={`${STAGE} bg-surround`} />
            {LANES.map(({ name, height }) => (
              <div key={name} className="flex border-t border-rule" style={{ height }}>
                <div className="w-29 border-r border-rule px-3 py-2 max-md:w-19">
                  <Skeleton className="h-3 w-12" />
                </div>
              </div>
            ))}
          </div>
        </div>
      </div>
    </Loading>
  );
}
