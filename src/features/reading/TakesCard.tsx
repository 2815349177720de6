import clsx from 'clsx';
import { Link } from 'react-router';
import type { Sketch, Take } from '../../../shared/api/takes.ts';
import { Card } from '../../components/Card.tsx';
import { FlightGlyph } from '../../components/FlightGlyph.tsx';
import { STATE_INK, STATE_WORDS } from '../../components/StateChip.tsx';
import { paths } from '../../lib/paths.ts';
import { sketchPath } from './sketchPath.ts';
import { takeNews } from './takeNews.ts';

const WIDTH = 88;
const HEIGHT = 46;

function Arc({ sketch, take }: { sketch: Sketch | null; take: Take }) {
  return (
    <span className="relative block rounded-[6px] bg-well">
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} width={WIDTH} height={HEIGHT} className="block" aria-hidden="true">
        {sketch && <path d={sketchPath(sketch, { width: WIDTH, height: HEIGHT, pad: 8 })} className="pencil" />}
      </svg>
      <FlightGlyph state={take.review} className={clsx('absolute top-1 right-1.5', STATE_INK[take.review])} />
    </span>
  );
}

interface TakesCardProps {
  slug: string;
  takes: readonly Take[];
  currentId: string;
}

/** The trail of a shot's takes: each a small arc as it was measured, under what became of it. */
export function TakesCard({ slug, takes, currentId }: TakesCardProps) {
  const at = takes.findIndex((take) => take.id === currentId);
  const before = takes[at - 1]?.sketch;
  const current = takes[at]?.sketch;
  const news = before && current ? takeNews(before.findings, current.findings) : '';
  return (
    <Card className="px-4 py-3" aria-labelledby="takes-heading">
      <h2 id="takes-heading" className="mb-2 text-md">
        Takes
      </h2>
      <ol className="flex flex-wrap items-end gap-x-2.5 gap-y-2">
        {takes.map((take) => {
          const isCurrent = take.id === currentId;
          const count = take.sketch ? take.sketch.findings.length : null;
          return (
            <li key={take.id} className="text-center text-xs">
              <Link
                to={paths.take(slug, take.shotNumber, take.number)}
                aria-current={isCurrent ? 'page' : undefined}
                className="block rounded-[6px] no-underline"
              >
                <span className={clsx('block rounded-[6px]', isCurrent && 'outline-2 outline-ink')}>
                  <Arc sketch={take.sketch} take={take} />
                </span>
                <span className={clsx('mt-1 block', isCurrent ? 'font-semibold' : 'text-graphite')}>
                  Take {take.number}
                  <span className="sr-only">, {STATE_WORDS[take.review].toLowerCase()}</span>
                  {count !== null && (
                    <>
                      {' · '}
                      {count}
                      <span className="sr-only">{count === 1 ? ' finding' : ' findings'}</span>
                    </>
                  )}
                </span>
              </Link>
            </li>
          );
        })}
        {news && <li className="max-w-28 pb-5 text-xs text-graphite">{news}</li>}
      </ol>
    </Card>
  );
}
