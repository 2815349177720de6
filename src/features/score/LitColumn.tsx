import { type Playhead, useFrame, useLitFrame } from '../../lib/playhead.ts';
import type { Columns } from './columns.ts';

/** The column of the chosen frame through all lanes, and faintly the one pointed at. */
export function LitColumn({ columns, playhead }: { columns: Columns; playhead: Playhead }) {
  const frame = useFrame(playhead);
  const lit = useLitFrame(playhead);
  const place = (at: number) => ({ width: columns.width, transform: `translateX(${(at - 1) * columns.width}px)` });
  return (
    <div className="pointer-events-none absolute inset-y-0 left-(--names) z-0" aria-hidden="true">
      <div className="absolute inset-y-0 bg-ink/9" style={place(frame)} />
      {lit !== frame && <div className="absolute inset-y-0 bg-ink/5" style={place(lit)} />}
    </div>
  );
}
