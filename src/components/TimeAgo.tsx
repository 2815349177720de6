import { ago, inFull } from '../lib/dateWords.ts';
import { useNow } from '../lib/useNow.ts';

/** How long ago, kept current; the full time on hover and for machines. */
export function TimeAgo({ at, className }: { at: string; className?: string }) {
  return (
    <time dateTime={at} title={inFull(at)} className={className}>
      {ago(at, useNow())}
    </time>
  );
}
