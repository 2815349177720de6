import { z } from 'zod';
import { contract } from './contract.ts';
import { shotNumberSchema, slugSchema } from './names.ts';
import { personSchema } from './people.ts';
import { reviewStateSchema, takeSchema } from './takes.ts';

export const shotSchema = z
  .object({
    id: z.uuid(),
    revision: z.int().nonnegative(),
    number: z.string(),
    sequence: z.string(),
    title: z.string(),
    /** State of the latest take; null while there is none. */
    state: reviewStateSchema.nullable(),
    /** Who posted the latest take. */
    animator: personSchema.nullable(),
    /** Who decided last on this shot. */
    mentor: personSchema.nullable(),
    /** When the latest take was posted, while it waits. */
    waitingSince: z.iso.datetime().nullable(),
    /** Number of the take that is posted next; a number that was moved away is not given again. */
    nextTakeNumber: z.int().positive(),
  })
  .meta({ id: 'Shot' });
export type Shot = z.infer<typeof shotSchema>;

export const shotWithTakesSchema = shotSchema.extend({ takes: z.array(takeSchema) }).meta({ id: 'ShotWithTakes' });
/** A shot with its takes, first to last: a row of the shot sheet. */
export type ShotWithTakes = z.infer<typeof shotWithTakesSchema>;

export const shotContracts = {
  sheet: contract({
    method: 'get',
    path: '/productions/:slug/shots',
    summary: 'The shot sheet: every shot with its takes, by number',
    params: z.object({ slug: slugSchema }),
    response: z.object({ shots: z.array(shotWithTakesSchema) }),
  }),
  read: contract({
    method: 'get',
    path: '/productions/:slug/shots/:shotNumber',
    summary: 'One shot with its takes',
    params: z.object({ slug: slugSchema, shotNumber: shotNumberSchema }),
    response: shotWithTakesSchema,
  }),
};
