import { useCallback, useEffect, useRef, useState } from 'react';
import { useLocation, useNavigate, useSearchParams } from 'react-router';
import { type Layer, layersFromAddress, layersToAddress, switchLayer } from '../../features/layers/layerChoice.ts';
import type { Playhead } from '../../lib/playhead.ts';

/** Longer than a key repeats, so that stepping through a strip writes the address once. */
const SETTLED_MS = 200;

/** Marks an address that this page wrote itself. */
const OWN = { writtenBy: 'take' };
const isOwn = (state: unknown) =>
  typeof state === 'object' && state !== null && 'writtenBy' in state && state.writtenBy === OWN.writtenBy;

/** The frame of an address in the document's count; null when it names none. */
export function frameOfAddress(search: URLSearchParams, firstFrame: number): number | null {
  const shown = search.get('frame');
  return shown !== null && /^-?\d{1,9}$/.test(shown) ? Number(shown) - firstFrame + 1 : null;
}

/**
 * Keeps the address and the page together: the chosen frame (in the production's number) and the layers. Changes replace
 * the address, so that "back" leaves the take. What comes by the address, as from a link, is taken over.
 */
export function useTakeAddress(playhead: Playhead, firstFrame: number) {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const [layers, setLayers] = useState(() => layersFromAddress(search.get('layers')));
  // The router answers a moment later; until then this is what the address will say.
  const said = useRef({ frame: search.get('frame'), layers: search.get('layers') });

  const latestSearch = useRef(search);
  useEffect(() => {
    latestSearch.current = search;
  });

  const write = useCallback(
    (change: Partial<typeof said.current>) => {
      said.current = { ...said.current, ...change };
      const next = new URLSearchParams(latestSearch.current);
      for (const [name, value] of Object.entries(said.current)) {
        if (value === null) next.delete(name);
        else next.set(name, value);
      }
      // A comma needs no escape in a query, and people read this address.
      const words = next.toString().replaceAll('%2C', ',');
      void navigate({ search: words && `?${words}` }, { replace: true, preventScrollReset: true, state: OWN });
    },
    [navigate],
  );
  const latest = useRef(write);
  useEffect(() => {
    latest.current = write;
  });

  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    let before = playhead.frame();
    const leave = playhead.subscribe(() => {
      if (playhead.playing() || playhead.frame() === before) return;
      clearTimeout(timer);
      timer = setTimeout(() => {
        before = playhead.frame();
        latest.current({ frame: String(before + firstFrame - 1) });
      }, SETTLED_MS);
    });
    return () => {
      clearTimeout(timer);
      leave();
    };
  }, [playhead, firstFrame]);

  const { key, state } = useLocation();
  useEffect(() => {
    // Our own words come back here too, maybe after newer ones.
    if (isOwn(state)) return;
    said.current = { frame: search.get('frame'), layers: search.get('layers') };
    const frame = frameOfAddress(search, firstFrame);
    if (frame !== null) playhead.choose(frame);
    setLayers(layersFromAddress(said.current.layers));
  }, [key, state, search, firstFrame, playhead]);

  const onSwitch = useCallback((layer: Layer) => {
    setLayers((have) => switchLayer(have, layer));
  }, []);
  useEffect(() => {
    const words = layersToAddress(layers);
    if (words !== said.current.layers) latest.current({ layers: words });
  }, [layers]);

  return { layers, onSwitch };
}
