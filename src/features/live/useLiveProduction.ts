import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { productionContracts } from '../../../shared/api/productions.ts';
import { call } from '../../lib/call.ts';
import { setLineState } from '../../lib/lineState.ts';
import { liveProduction } from '../../lib/liveProduction.ts';
import { hereOptions, productionOptions, seenOptions } from '../../lib/queries/production.ts';
import { applyProgress } from '../../lib/queries/take.ts';
import { socket } from '../../lib/socket.ts';
import { applyEvent } from './applyEvent.ts';
import { replayDuringFetch } from './replayDuringFetch.ts';

/** Keeps everything cached of a production live while it is mounted. Mount once for each production. */
export function useLiveProduction(slug: string, onEnded: () => void): void {
  const client = useQueryClient();

  useEffect(() => {
    const seenKey = seenOptions(slug).queryKey;
    const first = client.getQueryData(productionOptions(slug).queryKey)?.eventSeq ?? 0;
    const replay = replayDuringFetch(client, (event) => applyEvent(client, slug, event));
    setLineState('connecting');
    const live = liveProduction({
      slug,
      socket,
      seen: client.getQueryData(seenKey) ?? first,
      fetchAfter: (after) => call(productionContracts.events, { params: { slug }, query: { after, limit: 500 } }),
      onEvent: (event) => {
        applyEvent(client, slug, event);
        replay.applied(event);
        client.setQueryData(seenKey, event.seq);
      },
      onProgress: (progress) => applyProgress(client, progress),
      onHere: (people) => client.setQueryData(hereOptions(slug).queryKey, people),
      onState: (state) => {
        setLineState(state);
        if (state === 'ended') onEnded();
      },
    });
    client.setQueryData(seenKey, live.seen());
    return () => {
      live.leave();
      replay.stop();
    };
  }, [client, slug, onEnded]);
}
