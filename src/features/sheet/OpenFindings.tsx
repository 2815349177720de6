import type { ShotWithTakes } from '../../../shared/api/shots.ts';

/** How many findings of the latest take are still open, in words; red only where there is something to do. */
export function OpenFindings({ shot }: { shot: ShotWithTakes }) {
  const latest = shot.takes.at(-1);
  if (!latest) return <span className="text-graphite">–</span>;
  if (latest.reading.status === 'failed') return <span className="text-graphite">could not be read</span>;
  if (!latest.sketch || latest.reading.status !== 'read') return <span className="text-graphite">being read</span>;
  const count = latest.sketch.findings.length;
  if (count === 0) return <span className="text-graphite">none</span>;
  if (shot.state === 'waived') return <span className="text-graphite">{count} waived</span>;
  if (shot.state === 'cleared') return <span className="text-graphite">{count}, cleared</span>;
  return <span className="font-mono font-semibold text-red">{count}</span>;
}
