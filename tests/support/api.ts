import type { APIContext, APIRoute } from 'astro';
import { onRequest } from '@/middleware';
import { lucia } from '@/server/auth/lucia';

export const ORIGIN = 'http://steadmain.test';

export interface Call {
  readonly method?: string;
  readonly path?: string;
  readonly params?: Readonly<Record<string, string>>;
  /** Sent as JSON. */
  readonly body?: unknown;
  /** Sent as it is. */
  readonly raw?: BodyInit;
  readonly headers?: Readonly<Record<string, string>>;
  /** The session's id. */
  readonly session?: string;
  /** null: none is sent. */
  readonly origin?: string | null;
  readonly address?: string;
  readonly signal?: AbortSignal;
}

function headersOf(call: Call): Headers {
  const headers = new Headers({ host: 'steadmain.test', ...call.headers });
  if (call.session) headers.set('cookie', `${lucia.sessionCookieName}=${call.session}`);
  if (call.origin !== null) headers.set('origin', call.origin ?? ORIGIN);
  if (call.body !== undefined) headers.set('content-type', 'application/json');
  return headers;
}

function contextOf(call: Call): APIContext {
  const path = call.path ?? '/api/test';
  const url = new URL(path, ORIGIN);
  const body = call.raw ?? (call.body === undefined ? undefined : JSON.stringify(call.body));
  const method = call.method ?? (body === undefined ? 'GET' : 'POST');
  const request = new Request(url, {
    method,
    headers: headersOf(call),
    ...(body === undefined ? {} : { body, duplex: 'half' }),
    ...(call.signal ? { signal: call.signal } : {}),
  });
  const context: Partial<APIContext> = {
    request,
    url,
    params: { ...call.params },
    locals: {} as App.Locals,
    clientAddress: call.address ?? '192.0.2.1',
    isPrerendered: false,
    routePattern: path,
  };
  return context as APIContext;
}

/** Calls an endpoint through the middleware, as the application does. */
export async function callApi(route: APIRoute, call: Call = {}): Promise<Response> {
  const context = contextOf(call);
  return (await onRequest(context, async () => route(context))) as Response;
}

/** The status and the body's code of an answer. */
export async function outcome(response: Response): Promise<{ status: number; code: string | undefined }> {
  const body = (await response.json()) as { code?: string };
  return { status: response.status, code: body.code };
}
