import { useCallback, useMemo, useState } from 'react';
import { fitView, holdView, type Margins, panBy, type Size, type View, zoomAbout } from './view.ts';

export interface ViewControl {
  view: View;
  /** The whole picture is seen. */
  fitted: boolean;
  /** Zooms about a place of the room, px of the screen; about its middle when left out. */
  zoom: (factor: number, at?: { x: number; y: number }) => void;
  pan: (dx: number, dy: number) => void;
  fit: () => void;
}

/** What of the picture is seen. Until someone zooms, the whole picture, whatever the size of its room. */
export function useView(picture: Size, room: Size, margins: Margins): ViewControl {
  const [chosen, setChosen] = useState<View | null>(null);
  const { top, right, bottom, left } = margins;
  const fitted = useMemo(
    () => fitView(picture, room, { top, right, bottom, left }),
    [picture, room, top, right, bottom, left],
  );
  const zoom = useCallback(
    (factor: number, at = { x: room.width / 2, y: room.height / 2 }) =>
      setChosen((have) => {
        const next = zoomAbout(have ?? fitted, factor, at, fitted.scale);
        return next.scale <= fitted.scale * 1.001 ? null : holdView(next, picture, room);
      }),
    [fitted, picture, room],
  );
  const pan = useCallback(
    (dx: number, dy: number) => setChosen((have) => have && holdView(panBy(have, dx, dy), picture, room)),
    [picture, room],
  );
  const fit = useCallback(() => setChosen(null), []);
  const view = useMemo(() => (chosen ? holdView(chosen, picture, room) : fitted), [chosen, fitted, picture, room]);
  return { view, fitted: chosen === null, zoom, pan, fit };
}
