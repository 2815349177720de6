import type { z } from 'zod';

type ObjectSchema = z.ZodObject;

/**
 * One way through the API, declared once: the server's `endpoint` validates with it, the client's `call` is typed by it
 * and `/api/openapi.json` is written from it.
 */
export interface Contract<
  Params extends ObjectSchema | undefined = ObjectSchema | undefined,
  Query extends ObjectSchema | undefined = ObjectSchema | undefined,
  Body extends z.ZodType | undefined = z.ZodType | undefined,
  Response extends z.ZodType | undefined = z.ZodType | undefined,
> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express style, below `/api`: `/takes/:takeId/threads`. */
  path: string;
  summary: string;
  /** Only sign-in and health are open; everything else answers 401 without a session. */
  open?: boolean;
  params?: Params;
  query?: Query;
  body?: Body;
  /** Left out: 204 without a body. */
  response?: Response;
  /** 200 unless told; 204 when there is no response. */
  status?: number;
  /** The body is multipart/form-data with pictures under this field. */
  files?: string;
  /** The response is not JSON: its media type. */
  binary?: string;
}

/** Keeps the exact schema types of a contract; does nothing at run time. */
export function contract<
  Params extends ObjectSchema | undefined = undefined,
  Query extends ObjectSchema | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
  Response extends z.ZodType | undefined = undefined,
>(declared: Contract<Params, Query, Body, Response>): Contract<Params, Query, Body, Response> {
  return declared;
}

/** The parsed output of a contract part; `undefined` where the contract has no such part. */
export type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
/** What a caller may pass for a contract part (before defaults are filled in). */
export type Given<S> = S extends z.ZodType ? z.input<S> : undefined;
