import { type MiddlewareFunction, redirect } from 'react-router';
import { paths } from '../lib/paths.ts';
import { productionOptions } from '../lib/queries/production.ts';
import { sessionOptions } from '../lib/queries/session.ts';
import { queryClientContext } from '../lib/routerContext.ts';

/** Lets only those through who are signed in; others go to the sign-in page and come back afterwards. */
export const requireSession: MiddlewareFunction = async ({ context, request }) => {
  const session = await context.get(queryClientContext).query({ ...sessionOptions(), staleTime: 'static' });
  if (session) return;
  const { pathname, search } = new URL(request.url);
  throw redirect(paths.signIn(pathname + search));
};

/**
 * Reads the production before anything else of it: what is fetched later can then only be newer than the event number
 * the live log starts from.
 */
export const warmProduction: MiddlewareFunction = async ({ context, params }) => {
  await context.get(queryClientContext).query({ ...productionOptions(params.slug!), staleTime: 'static' });
};

/** The address without a path: the first production, or the sign-in page. */
export const openFirstProduction: MiddlewareFunction = async ({ context }) => {
  const session = await context.get(queryClientContext).query({ ...sessionOptions(), staleTime: 'static' });
  if (!session) throw redirect(paths.signIn());
  const first = session.productions[0];
  if (first) throw redirect(paths.feed(first.slug));
};
