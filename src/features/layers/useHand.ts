import { type PointerEvent, type RefObject, useEffect, useRef } from 'react';
import type { ViewControl } from './useView.ts';

interface Finger {
  x: number;
  y: number;
}

/** A press that moves less than this, px of the screen, is a press and not a drag. */
const STILL = 4;

/**
 * The hand on the picture. Once it is zoomed a drag moves it, and so does a press, which brings its place to the middle:
 * nobody has to drag (WCAG 2.2, 2.5.7). Two fingers pinch, the wheel zooms while Ctrl is down; without Ctrl it scrolls the
 * page, as everywhere else.
 */
export function useHand(ref: RefObject<HTMLElement | null>, control: ViewControl) {
  const fingers = useRef(new Map<number, Finger>());
  const pressed = useRef<Finger | null>(null);
  const latest = useRef(control);
  useEffect(() => {
    latest.current = control;
  });

  useEffect(() => {
    const element = ref.current;
    if (!element) return;
    const handleWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !event.metaKey) return;
      event.preventDefault();
      const box = element.getBoundingClientRect();
      latest.current.zoom(Math.exp(-event.deltaY * 0.004), { x: event.clientX - box.left, y: event.clientY - box.top });
    };
    // React listens passively to wheels, and a passive listener cannot keep the browser from zooming the page.
    element.addEventListener('wheel', handleWheel, { passive: false });
    return () => element.removeEventListener('wheel', handleWheel);
  }, [ref]);

  const handlePointerMove = (event: PointerEvent) => {
    const before = fingers.current.get(event.pointerId);
    if (!before) return;
    const here = { x: event.clientX, y: event.clientY };
    const other = [...fingers.current].find(([id]) => id !== event.pointerId)?.[1];
    fingers.current.set(event.pointerId, here);
    if (other) {
      const box = ref.current!.getBoundingClientRect();
      const factor =
        Math.hypot(here.x - other.x, here.y - other.y) / Math.hypot(before.x - other.x, before.y - other.y);
      if (Number.isFinite(factor) && factor > 0) {
        control.zoom(factor, { x: (here.x + other.x) / 2 - box.left, y: (here.y + other.y) / 2 - box.top });
      }
    } else if (!control.fitted) {
      control.pan(here.x - before.x, here.y - before.y);
    }
  };
  const letGo = (event: PointerEvent) => fingers.current.delete(event.pointerId);
  const handlePointerUp = (event: PointerEvent) => {
    const from = pressed.current;
    const alone = fingers.current.size === 1;
    pressed.current = null;
    if (!letGo(event) || !from || !alone || control.fitted) return;
    if (Math.hypot(event.clientX - from.x, event.clientY - from.y) > STILL) return;
    const box = ref.current!.getBoundingClientRect();
    control.pan(box.left + box.width / 2 - event.clientX, box.top + box.height / 2 - event.clientY);
  };

  return {
    onPointerDown: (event: PointerEvent) => {
      if (event.button !== 0 || (event.target as Element).closest('button, [data-choose]')) return;
      pressed.current = fingers.current.size === 0 ? { x: event.clientX, y: event.clientY } : null;
      fingers.current.set(event.pointerId, { x: event.clientX, y: event.clientY });
      if (!control.fitted || fingers.current.size > 1) event.currentTarget.setPointerCapture(event.pointerId);
    },
    onPointerMove: handlePointerMove,
    onPointerUp: handlePointerUp,
    onPointerCancel: letGo,
    onPointerLeave: letGo,
  };
}
