import type { APIContext, APIRoute } from 'astro';
import type { z } from 'zod';
import type { Result } from '@/core/result';
import { authorize, type Authorized, type Permission } from '../auth/permissions';
import { check, readJson } from './body';
import { faultProblem } from './fault';
import { json, problemResponse, withStatus, type HttpProblem } from './problem';

type Params = Readonly<Record<string, string>>;
type Outcome<T> = Promise<Result<T, HttpProblem> | Response>;

interface Input<B, Q> {
  readonly body: B;
  readonly query: Q;
  readonly params: Params;
  readonly context: APIContext;
}

interface Schemas<B, Q> {
  /** Left out: the endpoint takes no body. */
  readonly body?: z.ZodType<B>;
  /** Left out: the query is ignored. */
  readonly query?: z.ZodType<Q>;
  /** Of a success; 200 unless said. A success without a value answers 204. */
  readonly status?: number;
}

interface EndpointOptions<P extends Permission, B, Q, T> extends Schemas<B, Q> {
  readonly permission: P;
  readonly handle: (input: Input<B, Q> & { readonly actor: Authorized<P> }) => Outcome<T>;
}

interface OpenEndpointOptions<B, Q, T> extends Schemas<B, Q> {
  readonly handle: (input: Input<B, Q>) => Outcome<T>;
}

const signInFirst: HttpProblem = { status: 401, code: 'SIGN-IN', message: 'Sign in first: your session has ended.' };

function fault(context: APIContext, error: unknown): Response {
  console.error(`${context.request.method} ${context.url.pathname} failed:`, error);
  return problemResponse(faultProblem(error));
}

async function readInput<B, Q>(context: APIContext, schemas: Schemas<B, Q>): Promise<Result<Input<B, Q>, HttpProblem>> {
  const search = Object.fromEntries(context.url.searchParams);
  const query = schemas.query ? check(schemas.query, search) : { ok: true as const, value: undefined as Q };
  if (!query.ok) return query;
  const body = schemas.body
    ? await readJson(context.request, schemas.body)
    : { ok: true as const, value: undefined as B };
  if (!body.ok) return body;
  return { ok: true, value: { body: body.value, query: query.value, params: context.params as Params, context } };
}

async function answer<T>(outcome: Outcome<T>, status = 200): Promise<Response> {
  const result = await outcome;
  if (result instanceof Response) return result;
  if (!result.ok) return problemResponse(result.error);
  if (result.value === undefined) return new Response(null, { status: 204, headers: { 'cache-control': 'no-store' } });
  return json(result.value, status);
}

/**
 * An endpoint for people signed in: session (401), role (403), input (400, 413, 415), then `handle`; what it throws is
 * logged and answered 500 without details.
 */
export function endpoint<P extends Permission, T, B = undefined, Q = undefined>(
  options: EndpointOptions<P, B, Q, T>,
): APIRoute {
  return async (context) => {
    try {
      const actor = context.locals.actor;
      if (!actor) return problemResponse(signInFirst);
      const authorized = authorize(actor, options.permission);
      if (!authorized.ok) return problemResponse(withStatus(403, authorized.error));
      const input = await readInput(context, options);
      if (!input.ok) return problemResponse(input.error);
      return await answer(options.handle({ ...input.value, actor: authorized.value }), options.status);
    } catch (error) {
      return fault(context, error);
    }
  };
}

/** An endpoint for anybody, such as signing in. */
export function openEndpoint<T, B = undefined, Q = undefined>(options: OpenEndpointOptions<B, Q, T>): APIRoute {
  return async (context) => {
    try {
      const input = await readInput(context, options);
      if (!input.ok) return problemResponse(input.error);
      return await answer(options.handle(input.value), options.status);
    } catch (error) {
      return fault(context, error);
    }
  };
}
