import { Card } from '../../components/Card.tsx';

/** What to keep in mind about a reading; sentences as the reading says them. */
export function Cautions({ cautions }: { cautions: readonly string[] }) {
  if (cautions.length === 0) return null;
  return (
    <Card className="px-4 py-3" aria-labelledby="cautions-heading">
      <h2 id="cautions-heading" className="text-md">
        Keep in mind
      </h2>
      <ul className="mt-1 space-y-1 text-sm text-graphite">
        {cautions.map((caution) => (
          <li key={caution} className="flex gap-2">
            <span aria-hidden="true">–</span>
            {caution}
          </li>
        ))}
      </ul>
    </Card>
  );
}
