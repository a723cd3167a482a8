/** An expected failure is a value; exceptions are left for bugs. */
export type Result<T, E = Problem> =
  { readonly ok: true; readonly value: T } | { readonly ok: false; readonly error: E };

/** A sentence a planner can act on, under a permanent code. */
export interface Problem {
  /** Permanent, searchable: never reused for another meaning. */
  readonly code: string;
  /** What happened, where, and what to do. */
  readonly message: string;
  /** The input field or place the problem belongs to, where there is one. */
  readonly field?: string;
}

/** Wraps a value as success. */
export const ok = <T>(value: T): { readonly ok: true; readonly value: T } => ({ ok: true, value });

/** Wraps a problem as failure. */
export const fail = <E>(error: E): { readonly ok: false; readonly error: E } => ({ ok: false, error });

/** Builds a {@link Problem}. */
export function problem(code: string, message: string, field?: string): Problem {
  return field === undefined ? { code, message } : { code, message, field };
}
