import { z } from 'zod';
import { findingKindSchema, severitySchema } from '../reading/kinds.ts';
import { frameRateSchema, holdSchema, outcomeSchema, readingSchema } from '../reading/document.ts';
import { contract } from './contract.ts';
import { personSchema } from './people.ts';
import { stampBoardSchema } from './stamps.ts';
import { shotNumberSchema, shotTitleSchema, slugSchema } from './names.ts';

export const reviewStateSchema = z.enum(['waiting', 'another-pass', 'cleared', 'waived']);
export type ReviewState = z.infer<typeof reviewStateSchema>;

export const progressSchema = z.object({
  takeId: z.uuid(),
  phase: z.enum(['decoding', 'finding', 'reading']),
  done: z.int().nonnegative(),
  total: z.int().nonnegative(),
});
/** How far the reading of a take is, in frames. Sent over the socket only. */
export type ReadingProgress = z.infer<typeof progressSchema>;

/** What a card or a take trail draws of a reading, without the whole document. Picture px, document frames. */
export const sketchSchema = z
  .object({
    width: z.number(),
    height: z.number(),
    outcome: outcomeSchema,
    marks: z.array(z.object({ object: z.string(), frame: z.int(), x: z.number(), y: z.number() })),
    arcs: z.array(
      z.object({
        object: z.string(),
        flight: z.string(),
        points: z.array(z.object({ frame: z.number(), x: z.number(), y: z.number() })),
      }),
    ),
    findings: z.array(
      z.object({
        id: z.string(),
        kind: findingKindSchema,
        severity: severitySchema,
        title: z.string(),
        flight: z.string().nullable(),
        fromFrame: z.int(),
        toFrame: z.int(),
      }),
    ),
    caution: z.string().nullable(),
  })
  .meta({ id: 'Sketch' });
export type Sketch = z.infer<typeof sketchSchema>;

export const decisionSchema = z
  .object({
    state: reviewStateSchema.exclude(['waiting']),
    remark: z.string(),
    by: personSchema,
    decidedAt: z.iso.datetime(),
  })
  .meta({ id: 'Decision' });
export type Decision = z.infer<typeof decisionSchema>;

export const takeSchema = z
  .object({
    id: z.uuid(),
    /** Number of the last event that changed this take: newer replaces older. */
    revision: z.int().nonnegative(),
    shotNumber: z.string(),
    number: z.int().positive(),
    postedBy: personSchema,
    postedAt: z.iso.datetime(),
    review: reviewStateSchema,
    decision: decisionSchema.nullable(),
    reading: z.object({
      status: z.enum(['queued', 'reading', 'read', 'failed']),
      /** A sentence for the animator when it failed. */
      message: z.string().nullable(),
    }),
    fps: frameRateSchema,
    hold: holdSchema.nullable(),
    firstFrame: z.int(),
    frames: z.int().positive(),
    width: z.int().positive(),
    height: z.int().positive(),
    changed: z.string(),
    intended: z.string(),
    /** Numbers missing between the posted files, as the production counts them. */
    missingFrames: z.array(z.int()),
    sketch: sketchSchema.nullable(),
    noteCount: z.int().nonnegative(),
    stamps: stampBoardSchema,
  })
  .meta({ id: 'Take' });
export type Take = z.infer<typeof takeSchema>;

const takeParams = z.object({ takeId: z.uuid() });
const frameParams = takeParams.extend({ frame: z.coerce.number().int().positive() });

export const takeContracts = {
  read: contract({
    method: 'get',
    path: '/productions/:slug/shots/:shotNumber/takes/:takeNumber',
    summary: 'One take of a shot',
    params: z.object({
      slug: slugSchema,
      shotNumber: shotNumberSchema,
      takeNumber: z.coerce.number().int().positive(),
    }),
    response: takeSchema,
  }),
  reading: contract({
    method: 'get',
    path: '/takes/:takeId/reading',
    summary: 'The reading of a take as a document',
    params: takeParams,
    response: readingSchema,
  }),
  readAgain: contract({
    method: 'post',
    path: '/takes/:takeId/reading',
    summary: 'Read a take again',
    params: takeParams,
    response: takeSchema,
    status: 202,
  }),
  picture: contract({
    method: 'get',
    path: '/takes/:takeId/frames/:frame/picture',
    summary: 'The picture of a frame, as posted',
    params: frameParams,
    binary: 'image/*',
  }),
  thumbnail: contract({
    method: 'get',
    path: '/takes/:takeId/frames/:frame/thumbnail',
    summary: 'A small picture of a frame',
    params: frameParams,
    binary: 'image/webp',
  }),
  decide: contract({
    method: 'post',
    path: '/takes/:takeId/decision',
    summary: 'Clear a take, ask for another pass, or waive what is off; a mentor does, and nobody for their own take',
    params: takeParams,
    body: z
      .object({
        state: reviewStateSchema.exclude(['waiting']),
        remark: z.string().trim().max(2000).default(''),
      })
      .refine((decision) => decision.state === 'cleared' || decision.remark.length > 0, {
        path: ['remark'],
        message: 'Say in a sentence why, so that the animator knows what to do.',
      }),
    response: takeSchema,
  }),
  move: contract({
    method: 'post',
    path: '/takes/:takeId/move',
    summary: 'Move a take that was posted to the wrong shot; it becomes the next take there',
    params: takeParams,
    body: z.object({ shotNumber: shotNumberSchema, shotTitle: shotTitleSchema.optional() }),
    response: takeSchema,
  }),
};

/** Address of a frame's picture, for `<img>` and SVG `<image>`. Frames count from 1. */
export function pictureUrl(takeId: string, frame: number): string {
  return `/api/takes/${takeId}/frames/${frame}/picture`;
}

/** Address of a frame's thumbnail (240 px wide WebP). Frames count from 1. */
export function thumbnailUrl(takeId: string, frame: number): string {
  return `/api/takes/${takeId}/frames/${frame}/thumbnail`;
}
