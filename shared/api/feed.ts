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

/** How much of a note a card shows, in characters. */
const EXCERPT = 160;

/** The beginning of a note on one line, cut between words. Both ends use it, so a card reads the same live and reloaded. */
export function excerptOf(body: string): string {
  const line = body.replaceAll(/\s+/g, ' ');
  const letters = [...line];
  if (letters.length <= EXCERPT) return line;
  const cut = letters.slice(0, EXCERPT).join('');
  const space = cut.lastIndexOf(' ');
  return `${space > EXCERPT / 2 ? cut.slice(0, space) : cut}…`;
}

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
