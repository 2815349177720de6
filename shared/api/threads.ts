import { z } from 'zod';
import { contract } from './contract.ts';
import { showsSomething } from './names.ts';
import { memberSchema } from './people.ts';
import { stampBoardSchema } from './stamps.ts';

const NOTHING_WRITTEN = 'Write something first.';
export const noteBodySchema = z
  .string()
  .trim()
  .min(1, { error: NOTHING_WRITTEN, abort: true })
  .max(4000, 'A note holds 4,000 characters; split it in two.')
  .refine(showsSomething, NOTHING_WRITTEN);

export const noteSchema = z
  .object({
    id: z.uuid(),
    threadId: z.uuid(),
    author: memberSchema,
    body: z.string(),
    writtenAt: z.iso.datetime(),
    stamps: stampBoardSchema,
  })
  .meta({ id: 'Note' });
export type Note = z.infer<typeof noteSchema>;

export const threadSchema = z
  .object({
    id: z.uuid(),
    takeId: z.uuid(),
    /** Frame of the document, from 1; screens show the production's number. */
    frame: z.int().positive(),
    /** First the note that was pinned, then the replies in order. */
    notes: z.array(noteSchema).min(1),
  })
  .meta({ id: 'Thread' });
export type Thread = z.infer<typeof threadSchema>;

export const threadContracts = {
  list: contract({
    method: 'get',
    path: '/takes/:takeId/threads',
    summary: 'Every thread on a take, in frame order',
    params: z.object({ takeId: z.uuid() }),
    response: z.object({ threads: z.array(threadSchema) }),
  }),
  pin: contract({
    method: 'post',
    path: '/takes/:takeId/threads',
    summary: 'Pin a note to a frame',
    params: z.object({ takeId: z.uuid() }),
    body: z.object({ frame: z.int().positive(), body: noteBodySchema }),
    response: threadSchema,
    status: 201,
  }),
  reply: contract({
    method: 'post',
    path: '/threads/:threadId/notes',
    summary: 'Reply in a thread',
    params: z.object({ threadId: z.uuid() }),
    body: z.object({ body: noteBodySchema }),
    response: noteSchema,
    status: 201,
  }),
};
