import { z } from 'zod';
import { tolerancesSchema } from '../reading/tolerances.ts';
import { contract } from './contract.ts';
import { productionEventSchema } from './events.ts';
import { slugSchema } from './names.ts';
import { memberSchema, roleSchema } from './people.ts';

export const productionSchema = z
  .object({
    id: z.uuid(),
    slug: z.string(),
    name: z.string(),
    myRole: roleSchema,
    members: z.array(memberSchema),
    tolerances: tolerancesSchema,
    /** Number of the newest event: ask for what comes after it. */
    eventSeq: z.int().nonnegative(),
  })
  .meta({ id: 'Production' });
export type Production = z.infer<typeof productionSchema>;

export const productionContracts = {
  read: contract({
    method: 'get',
    path: '/productions/:slug',
    summary: 'A production and its people',
    params: z.object({ slug: slugSchema }),
    response: productionSchema,
  }),
  events: contract({
    method: 'get',
    path: '/productions/:slug/events',
    summary: 'What happened after an event number, in order and without gaps',
    params: z.object({ slug: slugSchema }),
    query: z.object({
      after: z.coerce.number().int().nonnegative(),
      limit: z.coerce.number().int().min(1).max(500).default(200),
    }),
    response: z.object({ events: z.array(productionEventSchema), newest: z.int().nonnegative() }),
  }),
};
