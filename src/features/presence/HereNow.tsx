import { useQuery } from '@tanstack/react-query';
import { InkRing } from '../../components/InkRing.tsx';
import { hereOptions } from '../../lib/queries/production.ts';

const SHOWN = 5;

/** Who else has the production open now. */
export function HereNow({ slug, me }: { slug: string; me: string | undefined }) {
  const { data: here = [] } = useQuery(hereOptions(slug));
  const others = here.filter((person) => person.id !== me);
  if (others.length === 0) return null;
  return (
    <div className="hidden items-center gap-1.5 text-sm text-graphite lg:flex">
      <span>Here now</span>
      <ul className="flex gap-1">
        {others.slice(0, SHOWN).map((person) => (
          <li key={person.id} className="flex">
            <InkRing person={person} size="small" />
          </li>
        ))}
      </ul>
      {others.length > SHOWN && <span>and {others.length - SHOWN} more</span>}
    </div>
  );
}
