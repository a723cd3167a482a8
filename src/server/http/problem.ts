import type { ProblemDto } from '@/contracts/problem';
import type { Problem } from '@/core/result';

/** A refusal with its HTTP status; `extra` joins the answer's body. */
export interface HttpProblem extends ProblemDto {
  readonly status: number;
  readonly extra?: Readonly<Record<string, unknown>>;
}

/** Unknown, or another plant's: the two are not told apart. */
export function notFound(message = 'There is nothing here for your plant. Check the address.'): HttpProblem {
  return { status: 404, code: 'NOT-FOUND', message };
}

/** Refused as things stand: stale, over a limit, or not yet agreed. */
export function conflict(code: string, message: string, extra?: Readonly<Record<string, unknown>>): HttpProblem {
  return extra === undefined ? { status: 409, code, message } : { status: 409, code, message, extra };
}

/** Input that can't be right; `path` names the field. */
export function badInput(code: string, message: string, path?: string): HttpProblem {
  return path === undefined
    ? { status: 400, code, message }
    : { status: 400, code, message, fields: [{ path, message }] };
}

/** A problem of core or of a service under an HTTP status. */
export function withStatus(status: number, found: Problem): HttpProblem {
  const fields = found.field === undefined ? {} : { fields: [{ path: found.field, message: found.message }] };
  return { status, code: found.code, message: found.message, ...fields };
}

/** The answer that carries a refusal. */
export function problemResponse(found: HttpProblem, headers: Record<string, string> = {}): Response {
  const { status, extra, code, message, fields } = found;
  return json({ ...extra, code, message, ...(fields ? { fields } : {}) }, status, headers);
}

/** A JSON answer that nobody may keep. */
export function json(value: unknown, status = 200, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(value), {
    status,
    headers: { 'content-type': 'application/json; charset=utf-8', 'cache-control': 'no-store', ...headers },
  });
}
