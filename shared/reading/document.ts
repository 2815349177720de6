import { z } from 'zod';
import { findingKindSchema, measureNameSchema, severitySchema } from './kinds.ts';

/**
 * The reading: what is measured on a take, as one JSON document. It serves the API, the database, the screens and the
 * command alike. Frames count from 1 inside the document; `source.firstFrame` is what the production calls frame 1.
 * Lengths are picture pixels from the top-left corner (y grows downwards), times are frames, gravity is px/frame².
 */
export const READING_FORMAT = 'spandrel-reading/1';

export const frameRateSchema = z.object({ num: z.int().positive(), den: z.int().positive() });
/** Frames per second as an exact fraction: 23.976 is 24000/1001. */
export type FrameRate = z.infer<typeof frameRateSchema>;

export const holdSchema = z.union([z.literal(1), z.literal(2), z.literal(3), z.literal('mixed')]);
/** Frames each drawing is shown for: on ones, twos, threes, or a mix. */
export type Hold = z.infer<typeof holdSchema>;

const pointSchema = z.object({ x: z.number(), y: z.number() });
export type Point = z.infer<typeof pointSchema>;

export const sourceSchema = z.object({
  kind: z.enum(['frames', 'strip', 'animation', 'video', 'marks']),
  frames: z.int().nonnegative(),
  width: z.number().nonnegative(),
  height: z.number().nonnegative(),
  firstFrame: z.int(),
  fps: frameRateSchema,
  hold: holdSchema,
  exposure: z.array(z.int()),
  scale: z.object({ pxPerMetre: z.number().positive() }).nullable(),
});
export type Source = z.infer<typeof sourceSchema>;

export const markSchema = pointSchema.extend({
  frame: z.int(),
  radius: z.number().nonnegative().optional(),
  origin: z.enum(['found', 'hand', 'import', 'balance']),
  confidence: z.number().min(0).max(1).optional(),
});
/** Where the thing's centre is on one frame, px. A hidden frame has no mark. */
export type Mark = z.infer<typeof markSchema>;

export const contactSchema = pointSchema.extend({ frame: z.number(), origin: z.enum(['read', 'hand']) });
export type Contact = z.infer<typeof contactSchema>;

export const measureSchema = z.object({
  name: measureNameSchema,
  value: z.number(),
  low: z.number(),
  high: z.number(),
  expected: z.number().nullable(),
  tolerance: z.number().nullable(),
  verdict: z.enum(['off', 'true', 'cannot-tell']),
  kind: findingKindSchema.nullable(),
});
export type Measure = z.infer<typeof measureSchema>;

const estimateSchema = z.object({ value: z.number(), se: z.number().nonnegative() });

const arcPointSchema = pointSchema.extend({ frame: z.number() });

export const flightSchema = z.object({
  id: z.string(),
  takeOff: z.number().nullable(),
  landing: z.number().nullable(),
  judged: z.boolean(),
  apex: z.object({ frame: z.number(), x: z.number(), y: z.number(), seFrame: z.number(), seY: z.number() }).nullable(),
  across: estimateSchema,
  gravity: estimateSchema.extend({ metric: estimateSchema.nullable() }),
  residual: z.number().nonnegative(),
  model: z.enum(['flat', 'depth']),
  measures: z.array(measureSchema),
  trueArc: z.array(arcPointSchema),
});
/** An airborne span between two contacts. `takeOff` or `landing` is null where it lies outside the strip. */
export type Flight = z.infer<typeof flightSchema>;

export const outcomeSchema = z.enum(['read', 'too-few-marks', 'no-motion', 'not-in-flight', 'not-judged']);
export type Outcome = z.infer<typeof outcomeSchema>;

export const readObjectSchema = z.object({
  id: z.string(),
  what: z.enum(['thing', 'body', 'stream']),
  outcome: outcomeSchema,
  points: z.array(pointSchema.extend({ frame: z.int(), name: z.string() })),
  marks: z.array(markSchema),
  contacts: z.array(contactSchema),
  flights: z.array(flightSchema),
});
export type ReadObject = z.infer<typeof readObjectSchema>;

export const findingSchema = z.object({
  id: z.string(),
  kind: findingKindSchema,
  object: z.string(),
  flight: z.string().nullable(),
  fromFrame: z.int(),
  toFrame: z.int(),
  severity: severitySchema,
  title: z.string(),
  detail: z.string(),
  mend: z.array(z.object({ frame: z.int(), dx: z.number(), dy: z.number() })),
  chart: z.array(z.object({ from: z.int(), to: z.int(), ticks: z.array(z.number()) })),
});
export type Finding = z.infer<typeof findingSchema>;

export const readingSchema = z
  .object({
    format: z.literal(READING_FORMAT),
    id: z.string().optional(),
    engine: z.string(),
    source: sourceSchema,
    camera: z.object({
      moved: z.boolean(),
      offsets: z.array(z.object({ frame: z.int(), dx: z.number(), dy: z.number(), zoom: z.number() })),
    }),
    objects: z.array(readObjectSchema),
    findings: z.array(findingSchema),
    cautions: z.array(z.string()),
  })
  .meta({ id: 'Reading' });
export type Reading = z.infer<typeof readingSchema>;

/** The production's number for a frame of the document: frame 11 of a shot that starts at 1001 is 1011. */
export function shownFrame(frame: number, firstFrame: number): number {
  return frame + firstFrame - 1;
}
