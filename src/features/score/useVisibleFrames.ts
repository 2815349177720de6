import { type RefObject, useEffect, useState } from 'react';
import { type Columns, type FrameRange, visibleFrames } from './columns.ts';

/** The frames a scrolled score has to draw, and how far it is scrolled, px. Changes once for each painted frame at most. */
export function useVisibleFrames(
  scroller: RefObject<HTMLElement | null>,
  columns: Columns,
  room: number,
): FrameRange & { scrollLeft: number } {
  const [scrollLeft, setScrollLeft] = useState(0);
  useEffect(() => {
    const element = scroller.current;
    if (!element) return;
    let request = 0;
    const handleScroll = () => {
      cancelAnimationFrame(request);
      request = requestAnimationFrame(() => setScrollLeft(element.scrollLeft));
    };
    element.addEventListener('scroll', handleScroll, { passive: true });
    return () => {
      cancelAnimationFrame(request);
      element.removeEventListener('scroll', handleScroll);
    };
  }, [scroller]);
  const { from, to } = visibleFrames(columns, scrollLeft, room);
  return { from, to, scrollLeft };
}
