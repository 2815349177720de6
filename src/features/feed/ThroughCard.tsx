import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { Card } from '../../components/Card.tsx';
import { ThroughLine } from '../../components/ThroughLine.tsx';
import { paths } from '../../lib/paths.ts';
import { sheetOptions } from '../../lib/queries/shots.ts';
import { summarise, summarySentences } from '../../lib/sheetSummary.ts';

/** How many shots are through, in words and then drawn, in the margin of the feed. */
export function ThroughCard({ slug }: { slug: string }) {
  const { data } = useQuery(sheetOptions(slug));
  if (!data || data.shots.length === 0) return null;
  const summary = summarise(data.shots);
  const [first, ...rest] = summarySentences(summary);
  return (
    <Card className="px-4 py-3" aria-labelledby="through">
      <h2 id="through" className="text-md">
        Through review
      </h2>
      <p className="mt-1 text-sm">
        <b className="font-semibold">{first}</b> {rest.join(' ')}
      </p>
      <ThroughLine steps={summary.steps} total={summary.total} className="mt-2 w-full" />
      <Link to={paths.sheet(slug)} className="mt-2 inline-flex items-center text-sm touch:min-h-11">
        Open the shot sheet
      </Link>
    </Card>
  );
}
