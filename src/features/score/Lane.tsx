import clsx from 'clsx';
import type { ReactNode } from 'react';

export interface LaneProps {
  name: string;
  /** What its figures are, or its value on the lit frame. */
  sub?: ReactNode;
  height: number;
  /** Of the whole axis, px. */
  width: number;
  first?: boolean;
  children: ReactNode;
}

/** One stave of the score: its name stays at the left while the axis scrolls beneath. */
export function Lane({ name, sub, height, width, first, children }: LaneProps) {
  return (
    <div className={clsx('flex', !first && 'border-t border-rule')} style={{ minHeight: height }}>
      <div className="sticky left-0 z-20 w-(--names) shrink-0 border-r border-rule bg-sheet px-3 py-1 text-2xs text-graphite max-md:px-2">
        <b className="block text-xs leading-snug font-semibold text-ink">{name}</b>
        {sub}
      </div>
      <div className="relative" style={{ width, height }}>
        {children}
      </div>
    </div>
  );
}
