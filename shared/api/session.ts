import { z } from 'zod';
import { contract } from './contract.ts';
import { personSchema, roleSchema } from './people.ts';

export const sessionSchema = z
  .object({
    person: personSchema,
    productions: z.array(z.object({ slug: z.string(), name: z.string(), role: roleSchema })),
  })
  .meta({ id: 'Session' });
export type Session = z.infer<typeof sessionSchema>;

export const signInSchema = z.object({
  email: z.email('Write the address you sign in with.').max(254),
  password: z.string().min(1, 'Write your password.').max(200),
});
export type SignIn = z.infer<typeof signInSchema>;

export const sessionContracts = {
  signIn: contract({
    method: 'post',
    path: '/session',
    summary: 'Sign in',
    open: true,
    body: signInSchema,
    response: sessionSchema,
  }),
  read: contract({ method: 'get', path: '/session', summary: 'Who is signed in', response: sessionSchema }),
  signOut: contract({
    method: 'delete',
    path: '/session',
    summary: 'Sign out; ends the sockets of this session too',
  }),
  health: contract({
    method: 'get',
    path: '/health',
    summary: 'Whether the server and its database answer',
    open: true,
    response: z.object({ ok: z.literal(true), version: z.string() }),
  }),
};
