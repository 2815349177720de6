import { isDeepStrictEqual } from 'node:util';
import type { Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import type { Contract, Parsed } from '../../shared/api/contract.ts';
import { AppError, notFound } from '../errors.ts';
import type { PersonParts } from '../presenters/people.presenter.ts';
import type { PictureFile } from '../services/pictures.service.ts';
import { requireUser } from './requireUser.ts';

type ObjectSchema = z.ZodObject;

/** What a handler is given: the parsed values, never the raw ones. */
export interface Call<Params, Query, Body> {
  params: Params;
  query: Query;
  body: Body;
  /** Who is signed in. Open endpoints must not ask for it. */
  user: PersonParts;
  req: Request;
  res: Response;
}

type Answer<C> =
  C extends Contract<infer _P, infer _Q, infer _B, infer R>
    ? R extends z.ZodType
      ? z.input<R>
      : void | PictureFile
    : never;

export interface Endpoint {
  contract: Contract;
  handler: RequestHandler;
}

/** Development and tests also hold every answer against its schema; a field too many is a leak and fails. */
const CHECKS_ANSWERS = ['development', 'test'].includes(process.env.NODE_ENV ?? '');

/**
 * One route: asks for a session unless the contract is open, parses what came with the contract's schemas, runs, and
 * answers as the contract says. Express 5 hands whatever `run` throws to the error sink.
 */
export function endpoint<
  P extends ObjectSchema | undefined,
  Q extends ObjectSchema | undefined,
  B extends z.ZodType | undefined,
  R extends z.ZodType | undefined,
>(
  contract: Contract<P, Q, B, R>,
  run: (call: Call<Parsed<P>, Parsed<Q>, Parsed<B>>) => Promise<Answer<Contract<P, Q, B, R>>>,
): Endpoint {
  const handler: RequestHandler = async (req, res) => {
    if (!contract.open) requireUser(req);
    refuseOtherTypes(contract, req);
    const answer = await run({
      params: parseParams(contract.params, req.params) as Parsed<P>,
      query: parse(contract.query, req.query) as Parsed<Q>,
      body: parse(contract.body, req.body ?? {}) as Parsed<B>,
      user: req.user as PersonParts,
      req,
      res,
    });
    await send(res, contract as Contract, answer);
  };
  return { contract: contract as Contract, handler };
}

/** @throws {AppError} 415 for a body of a kind that the contract does not take; it would be read as no body at all. */
function refuseOtherTypes({ body, files }: Pick<Contract, 'body' | 'files'>, req: Request): void {
  const wanted = body ? 'application/json' : files ? 'multipart/form-data' : undefined;
  if (wanted && req.is(wanted) === false) {
    throw new AppError('invalid_request', `Send this as ${wanted}.`, { status: 415 });
  }
}

function parse(schema: z.ZodType | undefined, value: unknown): unknown {
  if (!schema) return undefined;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const fields = result.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
  const sentence = fields.length === 1 ? fields[0]!.message : 'Some of what was sent does not fit.';
  throw new AppError('invalid_request', sentence, { fields });
}

/** An address that cannot exist is not a wrong request: nothing is there. */
function parseParams(schema: z.ZodType | undefined, value: unknown): unknown {
  if (!schema) return undefined;
  const result = schema.safeParse(value);
  if (!result.success) throw notFound('thing');
  return result.data;
}

async function send(res: Response, contract: Contract, answer: unknown): Promise<void> {
  if (contract.binary) return sendPicture(res, answer as PictureFile);
  res.set('Cache-Control', 'no-store');
  if (!contract.response) {
    res.status(contract.status ?? 204).end();
    return;
  }
  if (CHECKS_ANSWERS) checkAnswer(contract, answer);
  res.status(contract.status ?? 200).json(answer);
}

/** A frame never changes under its address, and only those who may see it get it: private, for good. */
function sendPicture(res: Response, { path, mediaType }: PictureFile): Promise<void> {
  return new Promise((resolve, reject) => {
    const headers = { 'Content-Type': mediaType, 'Cache-Control': 'private, max-age=31536000, immutable' };
    res.sendFile(path, { dotfiles: 'allow', cacheControl: false, headers }, (error) => {
      if (!error) return resolve();
      // A reader that went away is no fault.
      if (res.headersSent || ('code' in error && error.code === 'ECONNABORTED')) return resolve();
      reject('code' in error && error.code === 'ENOENT' ? notFound('picture') : error);
    });
  });
}

function checkAnswer(contract: Contract, answer: unknown): void {
  const sent: unknown = JSON.parse(JSON.stringify(answer));
  const parsed = contract.response!.safeParse(sent);
  const name = `${contract.method} ${contract.path}`;
  if (!parsed.success) throw new Error(`The answer to ${name} breaks its schema: ${parsed.error.message}`);
  if (!isDeepStrictEqual(JSON.parse(JSON.stringify(parsed.data)), sent)) {
    throw new Error(`The answer to ${name} has fields that its schema does not name.`);
  }
}
