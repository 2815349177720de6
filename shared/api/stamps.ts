import { z } from 'zod';
import { contract } from './contract.ts';
import { personSchema } from './people.ts';

/** The five marks in ink. Stored as these words. */
export const STAMP_KINDS = ['agree', 'on-it', 'lovely', 'good-weight', 'unsure'] as const;
export const stampKindSchema = z.enum(STAMP_KINDS);
export type StampKind = z.infer<typeof stampKindSchema>;

/**
 * Every stamp on one take or note, in the order the kinds were first used. State, not a change: whoever gets it replaces
 * what they had, if `revision` (the number of the event that made it) is newer.
 */
export const stampBoardSchema = z
  .object({
    revision: z.int().nonnegative(),
    stamps: z.array(z.object({ kind: stampKindSchema, people: z.array(personSchema) })),
  })
  .meta({ id: 'StampBoard' });
export type StampBoard = z.infer<typeof stampBoardSchema>;

const noteStampParams = z.object({ noteId: z.uuid(), kind: stampKindSchema });
const takeStampParams = z.object({ takeId: z.uuid(), kind: stampKindSchema });

export const stampContracts = {
  stampNote: contract({
    method: 'put',
    path: '/notes/:noteId/stamps/:kind',
    summary: 'Put your stamp on a note',
    params: noteStampParams,
    response: stampBoardSchema,
  }),
  unstampNote: contract({
    method: 'delete',
    path: '/notes/:noteId/stamps/:kind',
    summary: 'Take your stamp off a note',
    params: noteStampParams,
    response: stampBoardSchema,
  }),
  stampTake: contract({
    method: 'put',
    path: '/takes/:takeId/stamps/:kind',
    summary: 'Put your stamp on a take',
    params: takeStampParams,
    response: stampBoardSchema,
  }),
  unstampTake: contract({
    method: 'delete',
    path: '/takes/:takeId/stamps/:kind',
    summary: 'Take your stamp off a take',
    params: takeStampParams,
    response: stampBoardSchema,
  }),
};
