import type { QueryClient } from '@tanstack/react-query';
import type { ProductionEvent } from '../../../shared/api/events.ts';
import { applyFeedCard, applyTalk } from '../../lib/queries/feed.ts';
import { applyShot } from '../../lib/queries/shots.ts';
import { applyTake, readingOptions } from '../../lib/queries/take.ts';
import { applyNote, applyNoteCount, applyStamps, applyThread } from '../../lib/queries/threads.ts';

/** Shows one event of the log. Every patch is idempotent by revision or id, so an event may come twice or late. */
export function applyEvent(client: QueryClient, slug: string, event: ProductionEvent): void {
  switch (event.kind) {
    case 'take:posted':
    case 'take:read':
    case 'take:decided':
    case 'take:moved': {
      const { card, shot } = event.payload;
      if (event.kind === 'take:moved') applyShot(client, slug, event.payload.from);
      applyShot(client, slug, shot);
      applyTake(client, slug, card.take);
      applyFeedCard(client, slug, card);
      if (event.kind === 'take:read') {
        void client.invalidateQueries({ queryKey: readingOptions(card.take.id).queryKey });
      }
      return;
    }
    case 'thread:pinned': {
      const { thread, noteCount } = event.payload;
      applyThread(client, thread);
      applyTalk(client, slug, thread.takeId, thread.frame, thread.notes, noteCount);
      applyNoteCount(client, slug, thread.takeId, noteCount);
      return;
    }
    case 'note:added': {
      const { takeId, frame, note, noteCount } = event.payload;
      applyNote(client, takeId, note);
      applyTalk(client, slug, takeId, frame, [note], noteCount);
      applyNoteCount(client, slug, takeId, noteCount);
      return;
    }
    case 'stamps:changed':
      applyStamps(client, slug, event.payload);
  }
}
