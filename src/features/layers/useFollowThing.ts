import { useEffect, useRef } from 'react';
import type { Point } from '../../../shared/reading/document.ts';
import type { Playhead } from '../../lib/playhead.ts';
import type { ViewControl } from './useView.ts';
import { panToSee, type Size } from './view.ts';

/** Keeps the thing in sight while someone steps through a picture that is zoomed. */
export function useFollowThing(
  control: ViewControl,
  room: Size,
  playhead: Playhead,
  thing: (frame: number) => Point | undefined,
) {
  const latest = useRef({ control, room, thing });
  useEffect(() => {
    latest.current = { control, room, thing };
  });
  useEffect(() => {
    let before = playhead.frame();
    return playhead.subscribe(() => {
      const now = latest.current;
      if (playhead.frame() === before) return;
      before = playhead.frame();
      const at = now.thing(before);
      if (!at || now.control.fitted) return;
      const by = panToSee(now.control.view, now.room, at);
      if (by) now.control.pan(by.x, by.y);
    });
  }, [playhead]);
}
