import { z } from 'zod';

/** The closed list of what can go wrong, known to both ends. Codes never change meaning; sentences may. */
export const ERROR_CODES = [
  'invalid_request',
  'sign_in_required',
  'wrong_sign_in',
  'too_many_attempts',
  'not_allowed',
  'own_take',
  'not_found',
  'conflict',
  'draft_closed',
  'draft_empty',
  'too_many_frames',
  'file_too_large',
  'file_refused',
  'foreign_origin',
  'storage_full',
  'internal',
] as const;
export const errorCodeSchema = z.enum(ERROR_CODES);
export type ErrorCode = z.infer<typeof errorCodeSchema>;

/** RFC 9457 problem details, with our stable `code` and, for bad input, the fields it is about. */
export const problemSchema = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    code: errorCodeSchema,
    fields: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  })
  .meta({ id: 'Problem' });
export type Problem = z.infer<typeof problemSchema>;
