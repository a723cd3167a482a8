import type { z } from 'zod';
import { fail, ok, type Result } from '@/core/result';
import { badInput, type HttpProblem } from './problem';

export const LARGEST_BODY_BYTES = 1_000_000;

const tooLarge: HttpProblem = {
  status: 413,
  code: 'INPUT-TOO-LARGE',
  message: 'That is more than one request may send.',
};

/** Input held to a schema; a refusal names every field that does not fit. */
export function check<T>(schema: z.ZodType<T>, input: unknown): Result<T, HttpProblem> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return ok(parsed.data);
  const fields = parsed.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  const first = fields[0];
  const message = first ? `${first.path ? `${first.path}: ` : ''}${first.message}` : 'The input does not fit.';
  return fail({ ...badInput('INPUT', message), fields });
}

async function readText(request: Request): Promise<Result<string, HttpProblem>> {
  if (Number(request.headers.get('content-length') ?? 0) > LARGEST_BODY_BYTES) return fail(tooLarge);
  const reader = request.body?.getReader();
  const decoder = new TextDecoder();
  let text = '';
  for (let bytes = 0; reader;) {
    const { done, value } = await reader.read();
    if (done) break;
    bytes += value.byteLength;
    if (bytes > LARGEST_BODY_BYTES) {
      await reader.cancel();
      return fail(tooLarge);
    }
    text += decoder.decode(value, { stream: true });
  }
  return ok(text + decoder.decode());
}

/** A request's JSON body held to a schema. */
export async function readJson<T>(request: Request, schema: z.ZodType<T>): Promise<Result<T, HttpProblem>> {
  const type = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase();
  if (type !== 'application/json') {
    return fail({ status: 415, code: 'INPUT-TYPE', message: 'Send JSON (content-type application/json).' });
  }
  const text = await readText(request);
  if (!text.ok) return text;
  let input: unknown;
  try {
    input = JSON.parse(text.value);
  } catch {
    return fail(badInput('INPUT-JSON', 'The body is not valid JSON.'));
  }
  return check(schema, input);
}
