import type { z } from 'zod';
import type { Contract, Given, Parsed } from '../../shared/api/contract.ts';
import { problemSchema } from '../../shared/errors.ts';
import { ApiProblem } from './ApiProblem.ts';

type Part<Name extends string, S> = S extends z.ZodType ? { [K in Name]: Given<S> } : { [K in Name]?: undefined };

export type CallOptions<P, Q, B> = Part<'params', P> &
  (Q extends z.ZodType ? { query?: Given<Q> } : { query?: undefined }) &
  Part<'body', B> & {
    /** Pictures of a multipart contract. */
    files?: File[];
    signal?: AbortSignal;
  };

/** The address of a contract with its `:params` and query filled in. Pure. */
export function addressOf(
  path: string,
  params: Record<string, unknown> = {},
  query: Record<string, unknown> = {},
): string {
  const filled = path.replace(/:([A-Za-z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) if (value !== undefined) search.set(name, String(value));
  const asked = search.toString();
  return `/api${filled}${asked ? `?${asked}` : ''}`;
}

/**
 * Calls one endpoint, typed by its contract from `shared/api`.
 * @throws {ApiProblem} when the server refuses, or cannot be reached; an aborted signal throws its own AbortError.
 */
export async function call<
  P extends z.ZodObject | undefined,
  Q extends z.ZodObject | undefined,
  B extends z.ZodType | undefined,
  R extends z.ZodType | undefined,
>(contract: Contract<P, Q, B, R>, options: CallOptions<P, Q, B>): Promise<Parsed<R>> {
  const { params, query, body, files, signal } = options as {
    params?: Record<string, unknown>;
    query?: Record<string, unknown>;
    body?: unknown;
    files?: File[];
    signal?: AbortSignal;
  };
  const response = await reach(addressOf(contract.path, params, query), {
    method: contract.method.toUpperCase(),
    credentials: 'same-origin',
    headers: { accept: 'application/json', ...(body === undefined ? {} : { 'content-type': 'application/json' }) },
    body: contract.files
      ? pictures(contract.files, files ?? [])
      : body === undefined
        ? undefined
        : JSON.stringify(body),
    signal,
  });
  if (!response.ok) throw await problemOf(response);
  return (contract.response ? await response.json() : undefined) as Parsed<R>;
}

async function reach(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, init);
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw new ApiProblem({
      code: 'unreachable',
      status: 0,
      detail: 'The server did not answer. What you wrote is still here; try again in a moment.',
    });
  }
}

function pictures(field: string, files: File[]): FormData {
  const form = new FormData();
  for (const file of files) form.append(field, file, file.name);
  return form;
}

async function problemOf(response: Response): Promise<ApiProblem> {
  const parsed = problemSchema.safeParse(await response.json().catch(() => null));
  if (parsed.success) return new ApiProblem(parsed.data);
  return new ApiProblem({
    code: 'internal',
    status: response.status,
    detail: 'The server could not answer that. Nothing you posted was lost; try again in a moment.',
  });
}
