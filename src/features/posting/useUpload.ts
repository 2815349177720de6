import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { draftContracts, type RefusedFile } from '../../../shared/api/drafts.ts';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { call } from '../../lib/call.ts';
import { draftOptions } from '../../lib/queries/draft.ts';
import { nextBatch, sortOut } from './batches.ts';

export interface Upload {
  status: 'idle' | 'sending' | 'failed';
  /** Files of this run that arrived, and that were chosen. */
  sent: number;
  total: number;
  /** Why the last batch did not arrive; the rest waits. */
  problem: string | null;
  /** Files this page would not send. What the server refused stands in the draft. */
  refused: RefusedFile[];
}

const IDLE: Upload = { status: 'idle', sent: 0, total: 0, problem: null, refused: [] };

/**
 * Sends pictures to a draft in batches, one after the other. A batch that fails waits with the rest until `retry`;
 * `cancel` stops what is on its way and keeps what arrived.
 */
export function useUpload(slug: string, draftId: string | null, onDraft: (draftId: string) => void) {
  const client = useQueryClient();
  const [upload, setUpload] = useState<Upload>(IDLE);
  const queue = useRef<File[]>([]);
  const running = useRef<AbortController | null>(null);
  const draft = useRef(draftId);
  useEffect(() => {
    draft.current = draftId;
  }, [draftId]);
  useEffect(() => () => running.current?.abort(), []);

  const run = useCallback(async () => {
    if (running.current) return;
    const controller = new AbortController();
    const { signal } = controller;
    running.current = controller;
    setUpload((have) => ({ ...have, status: 'sending', problem: null }));
    try {
      if (!draft.current) {
        const started = await call(draftContracts.start, { params: { slug }, signal });
        client.setQueryData(draftOptions(started.id).queryKey, started);
        draft.current = started.id;
        onDraft(started.id);
      }
      while (queue.current.length > 0) {
        const files = nextBatch(queue.current);
        const answer = await call(draftContracts.addPictures, { params: { draftId: draft.current }, files, signal });
        client.setQueryData(draftOptions(answer.id).queryKey, answer);
        queue.current = queue.current.slice(files.length);
        setUpload((have) => ({ ...have, sent: have.sent + files.length }));
      }
      setUpload((have) => ({ ...have, status: 'idle', sent: 0, total: 0 }));
    } catch (error) {
      if (!signal.aborted) setUpload((have) => ({ ...have, status: 'failed', problem: sentenceOf(error) }));
    } finally {
      if (running.current === controller) running.current = null;
    }
  }, [client, slug, onDraft]);

  const add = useCallback(
    (files: File[], already: number) => {
      const { usable, refused } = sortOut(files, already + queue.current.length);
      queue.current = [...queue.current, ...usable];
      setUpload((have) => ({
        ...have,
        total: have.total + usable.length,
        refused: [...have.refused.filter((one) => !files.some((file) => file.name === one.name)), ...refused],
      }));
      if (usable.length > 0) void run();
    },
    [run],
  );

  const cancel = useCallback(() => {
    running.current?.abort();
    running.current = null;
    queue.current = [];
    setUpload((have) => ({ ...IDLE, refused: have.refused }));
    // The server may have taken in a batch whose answer was cut off.
    if (draft.current) void client.invalidateQueries({ queryKey: draftOptions(draft.current).queryKey });
  }, [client]);

  return { upload, add, cancel, retry: () => void run() };
}
