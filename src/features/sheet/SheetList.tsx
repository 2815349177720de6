import { Link } from 'react-router';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { StateChip } from '../../components/StateChip.tsx';
import { TakeTrail } from '../../components/TakeTrail.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import { paths } from '../../lib/paths.ts';
import type { SequenceRows } from '../../lib/sheetSummary.ts';
import { OpenFindings } from './OpenFindings.tsx';

/** The shot sheet on a phone: each shot a few lines, nothing to scroll sideways. */
export function SheetList({ slug, groups }: { slug: string; groups: SequenceRows[] }) {
  return (
    <div className="overflow-hidden rounded-card border border-rule bg-sheet">
      {groups.map((group) => (
        <section key={group.sequence} aria-labelledby={`sequence-${group.sequence}`}>
          <h2
            id={`sequence-${group.sequence}`}
            className="border-b border-rule bg-paper px-3.5 py-2 font-sans text-sm font-semibold tracking-normal"
          >
            Sequence {group.sequence}{' '}
            <span className="ml-1 font-normal text-graphite">
              {group.through} of {group.shots.length} through
            </span>
          </h2>
          <ul>
            {group.shots.map((shot) => (
              <Item key={shot.id} slug={slug} shot={shot} />
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}

function Item({ slug, shot }: { slug: string; shot: ShotWithTakes }) {
  const latest = shot.takes.at(-1);
  return (
    <li className="border-b border-rule px-3.5 py-3 text-sm">
      <div className="flex items-start justify-between gap-3">
        <Link
          to={latest ? paths.take(slug, shot.number, latest.number) : paths.post(slug, shot.number)}
          className="block min-h-11 min-w-0 flex-1 no-underline"
        >
          <span className="block font-mono text-xs text-graphite">{shot.number}</span>
          <span className="block text-base font-semibold">{shot.title}</span>
        </Link>
        {shot.state && <StateChip state={shot.state} />}
      </div>
      {latest && (
        <TakeTrail takes={shot.takes} hrefOf={(take) => paths.take(slug, shot.number, take.number)} className="mt-1" />
      )}
      <dl className="mt-2 flex flex-wrap gap-x-4 gap-y-1 text-graphite [&_dd]:text-ink [&>div]:flex [&>div]:gap-1.5">
        <div>
          <dt>Open findings</dt>
          <dd>
            <OpenFindings shot={shot} />
          </dd>
        </div>
        {shot.animator && (
          <div>
            <dt>Animator</dt>
            <dd>{shot.animator.name}</dd>
          </div>
        )}
        {shot.mentor && (
          <div>
            <dt>Mentor</dt>
            <dd>{shot.mentor.name}</dd>
          </div>
        )}
        {shot.waitingSince && (
          <div>
            <dt>Waiting</dt>
            <dd className="font-mono">
              <TimeAgo at={shot.waitingSince} />
            </dd>
          </div>
        )}
      </dl>
    </li>
  );
}
