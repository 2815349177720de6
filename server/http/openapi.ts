import { createDocument, type ZodOpenApiOperationObject, type ZodOpenApiPathsObject } from 'zod-openapi';
import packageJson from '../../package.json' with { type: 'json' };
import type { Contract } from '../../shared/api/contract.ts';
import { problemSchema } from '../../shared/errors.ts';
import { SESSION_COOKIE } from './sessions.ts';

type Responses = ZodOpenApiOperationObject['responses'];

const PROBLEMS: Record<string, string> = {
  401: 'Nobody is signed in',
  403: 'Not allowed, or the request came from another site',
  404: 'There is no such thing',
  409: 'Things have changed in the meantime',
  422: 'The request does not fit',
  429: 'Too many attempts',
  default: 'Something else went wrong',
};

/** The description of the API as OpenAPI 3.1, written from the contracts that serve it. */
export function describeApi(contracts: Contract[]) {
  const paths: ZodOpenApiPathsObject = {};
  for (const contract of contracts) {
    const path = contract.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [contract.method]: operationOf(contract) };
  }
  return createDocument({
    openapi: '3.1.0',
    info: {
      title: 'Spandrel',
      version: packageJson.version,
      description:
        'Post a frame strip, read what is off in its flights, and talk about it on the picture. Sign in first and keep the ' +
        'cookie. Whatever is not a GET must name the address of the server in its Origin header.',
    },
    servers: [{ url: '/api' }],
    security: [{ session: [] }],
    paths,
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: SESSION_COOKIE } },
    },
  });
}

function operationOf(contract: Contract): ZodOpenApiOperationObject {
  const { params, query, body, files, open } = contract;
  const requestParams = { ...(params ? { path: params } : {}), ...(query ? { query } : {}) };
  return {
    summary: contract.summary,
    ...(open ? { security: [] } : {}),
    ...(params || query ? { requestParams } : {}),
    ...(body ? { requestBody: { required: true, content: { 'application/json': { schema: body } } } } : {}),
    ...(files ? { requestBody: { required: true, content: { 'multipart/form-data': pictures(files) } } } : {}),
    responses: { ...answerOf(contract), ...problemsOf(contract) },
  };
}

function pictures(field: string) {
  const several = { type: 'array' as const, items: { type: 'string' as const, format: 'binary' } };
  return { schema: { type: 'object' as const, properties: { [field]: several }, required: [field] } };
}

function answerOf({ response, status, binary }: Contract): Responses {
  if (binary) {
    const picture = { type: 'string' as const, format: 'binary' };
    return { '200': { description: 'The picture', content: { [binary]: { schema: picture } } } };
  }
  if (!response) return { '204': { description: 'Done' } };
  return { [`${status ?? 200}`]: { description: 'Done', content: { 'application/json': { schema: response } } } };
}

function problemsOf({ open, params, query, body, files, method, path }: Contract): Responses {
  const signIn = path === '/session' && method === 'post';
  const possible: Record<string, boolean> = {
    401: !open || signIn,
    403: !open || signIn,
    404: Boolean(params),
    409: Boolean(params) && method !== 'get',
    422: Boolean(body ?? query ?? files),
    429: signIn,
    default: true,
  };
  const content = { 'application/problem+json': { schema: problemSchema } };
  return Object.fromEntries(
    Object.entries(PROBLEMS)
      .filter(([status]) => possible[status])
      .map(([status, description]) => [status, { description, content }]),
  ) as Responses;
}
