import type { Take } from '../../../shared/api/takes.ts';
import { InkRing } from '../../components/InkRing.tsx';

/** What the animator wrote beside the take: what changed, what is intended. */
export function AnimatorWord({ take }: { take: Take }) {
  if (!take.changed && !take.intended) return null;
  return (
    <section aria-label={`What ${take.postedBy.name} wrote`} className="flex gap-2.5 px-1 text-sm">
      <InkRing person={take.postedBy} size="small" className="mt-px" />
      <div className="min-w-0 space-y-0.5">
        {take.changed && (
          <p>
            <span className="text-graphite">Changed: </span>
            {take.changed}
          </p>
        )}
        {take.intended && (
          <p>
            <span className="text-graphite">Intended: </span>
            {take.intended}
          </p>
        )}
      </div>
    </section>
  );
}
