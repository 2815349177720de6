import { useCallback, useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router';
import { type Layer, layersFromAddress, layersToAddress } from '../../features/layers/layerChoice.ts';
import type { Playhead } from '../../lib/playhead.ts';

/** Longer than a key repeats, so that stepping through a strip writes the address once. */
const SETTLED_MS = 200;

/** The frame of an address in the document's count; null when it names none. */
export function frameOfAddress(search: URLSearchParams, firstFrame: number): number | null {
  const shown = search.get('frame');
  return shown !== null && /^-?\d{1,9}$/.test(shown) ? Number(shown) - firstFrame + 1 : null;
}

/**
 * Keeps the address and the page together: the chosen frame (in the production's number) and the layers. Changes replace
 * the address, so that "back" leaves the take. A frame that comes by the address, as from a link, is chosen.
 */
export function useTakeAddress(playhead: Playhead, firstFrame: number) {
  const [search, setSearch] = useSearchParams();
  const written = useRef<string | null>(search.get('frame'));

  const change = useCallback(
    (name: string, value: string | null) => {
      // What React Router hands out may be a step behind when two changes follow at once.
      const next = new URLSearchParams(window.location.search);
      if (value === null) next.delete(name);
      else next.set(name, value);
      setSearch(next, { replace: true, preventScrollReset: true });
    },
    [setSearch],
  );

  const latest = useRef(change);
  useEffect(() => {
    latest.current = change;
  });
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    let before = playhead.frame();
    const leave = playhead.subscribe(() => {
      if (playhead.playing() || playhead.frame() === before) return;
      clearTimeout(timer);
      timer = setTimeout(() => {
        before = playhead.frame();
        written.current = String(before + firstFrame - 1);
        latest.current('frame', written.current);
      }, SETTLED_MS);
    });
    return () => {
      clearTimeout(timer);
      leave();
    };
  }, [playhead, firstFrame]);

  const asked = search.get('frame');
  useEffect(() => {
    if (asked === null || asked === written.current) return;
    written.current = asked;
    const frame = frameOfAddress(new URLSearchParams({ frame: asked }), firstFrame);
    if (frame !== null) playhead.choose(frame);
  }, [asked, playhead, firstFrame]);

  const setLayers = useCallback((layers: ReadonlySet<Layer>) => change('layers', layersToAddress(layers)), [change]);
  return { layers: layersFromAddress(search.get('layers')), setLayers };
}
