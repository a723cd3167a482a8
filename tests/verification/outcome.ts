/** Results opened, for tests and for the command that lists the outside checks; needs no test runner. */
import type { Result } from '@/core/result';

/** The value of a result that must have succeeded. */
export function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.error.code}: ${result.error.message}`);
  return result.value;
}

/** The code and field of a result that must have failed. */
export function failureOf(result: Result<unknown>): { code: string; message: string; field: string | undefined } {
  if (result.ok) throw new Error('expected a problem, got a value');
  return { code: result.error.code, message: result.error.message, field: result.error.field };
}
