import { Fragment } from 'react';
import { Link } from 'react-router';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { Card } from '../../components/Card.tsx';
import { StateChip } from '../../components/StateChip.tsx';
import { TakeTrail } from '../../components/TakeTrail.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import { paths } from '../../lib/paths.ts';
import type { SequenceRows } from '../../lib/sheetSummary.ts';
import { OpenFindings } from './OpenFindings.tsx';

const HEADINGS = ['Shot', 'Takes, first to last', 'State', 'Open findings', 'Animator', 'Mentor', 'Waiting since'];

/** The shot sheet on a desk: a row a shot, grouped by sequence. */
export function SheetTable({ slug, groups }: { slug: string; groups: SequenceRows[] }) {
  return (
    <Card className="overflow-hidden">
      <table className="w-full border-collapse text-sm">
        <thead>
          <tr className="border-b border-rule text-left text-graphite">
            {HEADINGS.map((heading) => (
              <th key={heading} scope="col" className="px-2 py-2 font-medium first:pl-3.5 last:pr-3.5 xl:px-3.5">
                {heading}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {groups.map((group) => (
            <Fragment key={group.sequence}>
              <tr className="border-b border-rule bg-paper">
                <th scope="colgroup" colSpan={HEADINGS.length} className="px-3.5 py-1.5 text-left font-semibold">
                  Sequence {group.sequence}{' '}
                  <span className="ml-1 font-normal text-graphite">
                    {group.through} of {group.shots.length} through
                  </span>
                </th>
              </tr>
              {group.shots.map((shot) => (
                <Row key={shot.id} slug={slug} shot={shot} />
              ))}
            </Fragment>
          ))}
        </tbody>
      </table>
    </Card>
  );
}

function Row({ slug, shot }: { slug: string; shot: ShotWithTakes }) {
  const latest = shot.takes.at(-1);
  const cell = 'px-2 py-1.5 align-middle first:pl-3.5 last:pr-3.5 xl:px-3.5';
  return (
    <tr className="border-b border-rule last:border-0">
      <th scope="row" className={`${cell} text-left font-normal`}>
        <span className="font-mono text-graphite">{shot.number}</span>
        <br />
        {latest ? (
          <Link
            to={paths.take(slug, shot.number, latest.number)}
            className="font-semibold no-underline hover:underline"
          >
            {shot.title}
          </Link>
        ) : (
          <span className="font-semibold">{shot.title}</span>
        )}
      </th>
      <td className={cell}>
        {latest ? (
          <TakeTrail takes={shot.takes} hrefOf={(take) => paths.take(slug, shot.number, take.number)} />
        ) : (
          <Link to={paths.post(slug, shot.number)}>Post its first take</Link>
        )}
      </td>
      <td className={cell}>
        {shot.state ? <StateChip state={shot.state} /> : <span className="text-graphite">–</span>}
      </td>
      <td className={cell}>
        <OpenFindings shot={shot} />
      </td>
      <td className={cell}>{shot.animator?.name ?? '–'}</td>
      <td className={cell}>{shot.mentor?.name ?? '–'}</td>
      <td className={`${cell} font-mono`}>{shot.waitingSince ? <TimeAgo at={shot.waitingSince} /> : '–'}</td>
    </tr>
  );
}
