import { z } from 'zod';

/** A role belongs to a membership of a production, never to the person. */
export const roleSchema = z.enum(['animator', 'mentor', 'producer', 'owner']);
export type Role = z.infer<typeof roleSchema>;

export const personSchema = z
  .object({ id: z.uuid(), name: z.string(), initials: z.string().min(1).max(3) })
  .meta({ id: 'Person' });
export type Person = z.infer<typeof personSchema>;

export const memberSchema = personSchema.extend({ role: roleSchema }).meta({ id: 'Member' });
export type Member = z.infer<typeof memberSchema>;
