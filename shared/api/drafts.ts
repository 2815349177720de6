import { z } from 'zod';
import { gridSchema } from '../finding/grid.ts';
import { frameRateSchema, holdSchema } from '../reading/document.ts';
import { contract } from './contract.ts';
import { shotNumberSchema, shotTitleSchema, slugSchema } from './names.ts';
import { takeSchema } from './takes.ts';

/** Limits of one post. The pictures of a draft arrive in batches, so that progress has a count and a lost line loses one batch. */
export const MAX_FRAMES = 2000;
export const MAX_PICTURES_PER_BATCH = 16;
export const MAX_PICTURE_BYTES = 40 * 1024 * 1024;

export const draftPictureSchema = z.object({
  name: z.string(),
  width: z.int().positive(),
  height: z.int().positive(),
  /** The number in the file's name, when it has one. */
  number: z.int().nullable(),
});
export type DraftPicture = z.infer<typeof draftPictureSchema>;

export const refusedFileSchema = z.object({ name: z.string(), reason: z.string() });
/** A file that cannot be used and the sentence that says why. The rest of the post is kept. */
export type RefusedFile = z.infer<typeof refusedFileSchema>;

export const draftSchema = z
  .object({
    id: z.uuid(),
    /** In the order of the shot: natural order of the names. */
    pictures: z.array(draftPictureSchema),
    /** One picture that holds a row or a grid of frames: how it is cut. Null for a numbered set. */
    grid: gridSchema.nullable(),
    /** Read from the file names where they carry one. */
    firstFrame: z.int().nullable(),
    missingFrames: z.array(z.int()),
    refused: z.array(refusedFileSchema),
    /** Sentences that stand beside the strip before it is posted: gaps, pictures of different sizes, too few frames. */
    warnings: z.array(z.string()),
    /** Whether it can be posted as it stands. */
    ready: z.boolean(),
  })
  .meta({ id: 'Draft' });
export type Draft = z.infer<typeof draftSchema>;

export const postSchema = z.object({
  shotNumber: shotNumberSchema,
  /** Needed for a new shot; an existing shot keeps its title. */
  shotTitle: shotTitleSchema.optional(),
  fps: frameRateSchema.refine((fps) => fps.num / fps.den >= 1 && fps.num / fps.den <= 240, {
    message: 'A frame rate lies between 1 and 240 frames a second.',
  }),
  /** Left out: found from the drawings. */
  hold: holdSchema.nullable().default(null),
  firstFrame: z.int().min(-1_000_000).max(10_000_000).default(1),
  changed: z.string().trim().max(2000).default(''),
  intended: z.string().trim().max(2000).default(''),
});
export type Post = z.input<typeof postSchema>;

const draftParams = z.object({ draftId: z.uuid() });

export const draftContracts = {
  start: contract({
    method: 'post',
    path: '/productions/:slug/drafts',
    summary: 'Start a post; nobody else sees it until it is posted',
    params: z.object({ slug: slugSchema }),
    response: draftSchema,
    status: 201,
  }),
  read: contract({
    method: 'get',
    path: '/drafts/:draftId',
    summary: 'A post that is being put together',
    params: draftParams,
    response: draftSchema,
  }),
  addPictures: contract({
    method: 'post',
    path: '/drafts/:draftId/pictures',
    summary: 'Add a batch of pictures; a wrong one is refused by name and the rest is kept',
    params: draftParams,
    files: 'pictures',
    response: draftSchema,
  }),
  removePicture: contract({
    method: 'delete',
    path: '/drafts/:draftId/pictures/:name',
    summary: 'Take a picture out of the post',
    params: draftParams.extend({ name: z.string().min(1).max(255) }),
    response: draftSchema,
  }),
  cut: contract({
    method: 'patch',
    path: '/drafts/:draftId/grid',
    summary: 'Correct how a strip picture is cut into frames; null: it is a frame, not a strip',
    params: draftParams,
    body: z.object({ grid: gridSchema.nullable() }),
    response: draftSchema,
  }),
  post: contract({
    method: 'post',
    path: '/drafts/:draftId/post',
    summary: 'Post the strip as the next take of its shot',
    params: draftParams,
    body: postSchema,
    response: takeSchema,
    status: 201,
  }),
  discard: contract({
    method: 'delete',
    path: '/drafts/:draftId',
    summary: 'Throw a post away',
    params: draftParams,
  }),
};
