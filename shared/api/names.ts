import { z } from 'zod';

/** The part of the address that names a production. */
export const slugSchema = z
  .string()
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/)
  .max(60);

/** A shot's number: letters and digits in groups, such as 020-0140. The first group is its sequence. */
export const shotNumberSchema = z
  .string()
  .trim()
  .regex(/^[A-Za-z0-9]+([-_.][A-Za-z0-9]+)*$/, 'A shot number is letters and digits in groups, such as 020-0140.')
  .max(40);

/** Whether a text shows anything: spaces, control characters and joiners of no width alone are no word. */
export function showsSomething(text: string): boolean {
  return /[^\s\p{Cc}\p{Cf}]/u.test(text);
}

const NO_TITLE = 'Give the shot a title.';
export const shotTitleSchema = z
  .string()
  .trim()
  .min(1, { error: NO_TITLE, abort: true })
  .max(120, 'A title holds 120 characters.')
  .refine(showsSomething, NO_TITLE);

/** The sequence a shot belongs to: what stands before the first hyphen, underscore or dot of its number. */
export function sequenceOf(shotNumber: string): string {
  return shotNumber.split(/[-_.]/)[0]!;
}
