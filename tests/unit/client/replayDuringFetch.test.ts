import { QueryClient } from '@tanstack/react-query';
import { expect, test } from 'vitest';
import { applyEvent } from '../../../src/features/live/applyEvent.ts';
import { replayDuringFetch } from '../../../src/features/live/replayDuringFetch.ts';
import { feedOptions } from '../../../src/lib/queries/feed.ts';
import { buildTake, buildTakeEvent } from '../../support/wire.ts';

const SLUG = 'paper-yard';

test('a take that arrives while the feed is being fetched is there when the older answer came', async () => {
  const client = new QueryClient();
  const replay = replayDuringFetch(client, (event) => applyEvent(client, SLUG, event));
  let answer: (page: { cards: []; nextCursor: null }) => void = () => {};
  const options = feedOptions(SLUG, 'everything');
  const fetched = client.infiniteQuery({
    ...options,
    queryFn: () => new Promise<{ cards: []; nextCursor: null }>((resolve) => (answer = resolve)),
  });
  const event = buildTakeEvent(4, 'take:posted', buildTake());
  applyEvent(client, SLUG, event);
  replay.applied(event);
  expect(client.getQueryData(options.queryKey)).toBeUndefined();

  answer({ cards: [], nextCursor: null });
  await fetched;
  expect(client.getQueryData(options.queryKey)?.pages[0]?.cards).toHaveLength(1);
  replay.stop();
});

test('an event that no fetch ran beside is not shown again later', async () => {
  const client = new QueryClient();
  let shown = 0;
  const replay = replayDuringFetch(client, () => {
    shown += 1;
  });
  replay.applied(buildTakeEvent(4, 'take:posted', buildTake()));
  await client.query({ queryKey: ['anything'], queryFn: async () => 1 });
  expect(shown).toBe(0);
  replay.stop();
});
