import { z } from 'zod';
import { feedCardSchema } from './feed.ts';
import { personSchema } from './people.ts';
import { shotSchema } from './shots.ts';
import { stampBoardSchema } from './stamps.ts';
import { noteSchema, threadSchema } from './threads.ts';

const numbered = z.object({
  /** Without gaps within a production, from 1. */
  seq: z.int().positive(),
  actor: personSchema.nullable(),
  at: z.iso.datetime(),
});

const aboutTake = z.object({ card: feedCardSchema, shot: shotSchema });

/**
 * One row of a production's event log, as it is stored, sent over the socket and answered to a client that was away.
 * Payloads carry state, not changes, and nothing that only one viewer may see.
 */
export const productionEventSchema = z
  .discriminatedUnion('kind', [
    numbered.extend({ kind: z.literal('take:posted'), payload: aboutTake }),
    // Something became of its reading: it was read, it failed, or it waits to be read again.
    numbered.extend({ kind: z.literal('take:read'), payload: aboutTake }),
    numbered.extend({ kind: z.literal('take:decided'), payload: aboutTake }),
    numbered.extend({
      kind: z.literal('take:moved'),
      payload: aboutTake.extend({ from: shotSchema, fromTakeNumber: z.int().positive() }),
    }),
    numbered.extend({
      kind: z.literal('thread:pinned'),
      payload: z.object({ thread: threadSchema, noteCount: z.int().positive() }),
    }),
    numbered.extend({
      kind: z.literal('note:added'),
      payload: z.object({
        takeId: z.uuid(),
        frame: z.int().positive(),
        note: noteSchema,
        noteCount: z.int().positive(),
      }),
    }),
    numbered.extend({
      kind: z.literal('stamps:changed'),
      payload: z.object({ takeId: z.uuid(), noteId: z.uuid().nullable(), board: stampBoardSchema }),
    }),
  ])
  .meta({ id: 'ProductionEvent' });
export type ProductionEvent = z.infer<typeof productionEventSchema>;
export type ProductionEventKind = ProductionEvent['kind'];
export type PayloadOf<K extends ProductionEventKind> = Extract<ProductionEvent, { kind: K }>['payload'];
