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

export const shotTitleSchema = z.string().trim().min(1, 'Give the shot a title.').max(120);

/** The sequence a shot belongs to: what stands before the first hyphen, underscore or dot of its number. */
export function sequenceOf(shotNumber: string): string {
  return shotNumber.split(/[-_.]/)[0]!;
}
