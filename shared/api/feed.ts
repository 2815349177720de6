import { z } from 'zod';
import { contract } from './contract.ts';
import { slugSchema } from './names.ts';
import { memberSchema } from './people.ts';
import { takeSchema } from './takes.ts';

export const feedFilterSchema = z.enum(['everything', 'waiting-on-me', 'mine', 'with-findings']);
export type FeedFilter = z.infer<typeof feedFilterSchema>;

export const feedCardSchema = z
  .object({
    take: takeSchema,
    poster: memberSchema,
    shotTitle: z.string(),
    /** The note said last, and the one it answers. */
    talk: z
      .array(z.object({ noteId: z.uuid(), author: memberSchema, frame: z.int().positive(), excerpt: z.string() }))
      .max(2),
  })
  .meta({ id: 'FeedCard' });
export type FeedCard = z.infer<typeof feedCardSchema>;

export const feedPageSchema = z.object({ cards: z.array(feedCardSchema), nextCursor: z.string().nullable() });
export type FeedPage = z.infer<typeof feedPageSchema>;

export const feedContracts = {
  page: contract({
    method: 'get',
    path: '/productions/:slug/feed',
    summary: 'Takes of the production, newest first',
    params: z.object({ slug: slugSchema }),
    query: z.object({
      filter: feedFilterSchema.default('everything'),
      cursor: z.string().max(100).optional(),
      limit: z.coerce.number().int().min(1).max(50).default(10),
    }),
    response: feedPageSchema,
  }),
};
