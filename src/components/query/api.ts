import type { ProblemDto } from '../../contracts/problem';

/** A refusal by the server: its status, its problem and, where the answer holds more, the whole body. */
export class ApiProblem extends Error {
  constructor(
    readonly status: number,
    readonly problem: ProblemDto,
    readonly body: unknown = problem,
  ) {
    super(problem.message);
    this.name = 'ApiProblem';
  }
}

const OFFLINE: ProblemDto = {
  code: 'NO-CONNECTION',
  message: 'No connection to Steadmain. Nothing was saved; try again when the network is back.',
};

function problemOf(body: unknown, status: number): ProblemDto {
  if (typeof body === 'object' && body !== null && 'code' in body && 'message' in body) return body as ProblemDto;
  return { code: `HTTP-${status}`, message: `Steadmain answered ${status}. Nothing was saved; try again.` };
}

async function bodyOf(response: Response): Promise<unknown> {
  const text = await response.text();
  if (text === '') return null;
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return null;
  }
}

export interface ApiInit {
  readonly method?: 'GET' | 'POST' | 'DELETE';
  /** Sent as JSON. */
  readonly body?: unknown;
  readonly signal?: AbortSignal;
}

/**
 * Calls an endpoint and gives its JSON.
 * @throws {ApiProblem} where the server refuses or can't be reached (status 0); an ended session leads to sign-in.
 */
export async function api<T>(path: string, init: ApiInit = {}): Promise<T> {
  const request: RequestInit = { method: init.method ?? 'GET', headers: { accept: 'application/json' } };
  if (init.signal) request.signal = init.signal;
  if (init.body !== undefined) {
    request.body = JSON.stringify(init.body);
    request.headers = { ...request.headers, 'content-type': 'application/json' };
  }
  let response: Response;
  try {
    response = await fetch(path, request);
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw new ApiProblem(0, OFFLINE);
  }
  const body = await bodyOf(response);
  if (!response.ok) throw new ApiProblem(response.status, problemOf(body, response.status), body);
  return body as T;
}

/** What to tell a person about any failure. */
export function messageOf(error: unknown): string {
  if (error instanceof ApiProblem) return error.problem.message;
  return 'Something went wrong on this page. Reload it; what was saved is safe.';
}
