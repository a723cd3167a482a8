import type { Session } from 'lucia';
import type { Result } from '@/core/result';
import { lucia } from '../auth/lucia';
import { json, problemResponse, type HttpProblem } from './problem';

/** Answers with the cookie of a session that was opened and the page to go on to, or with why none was. */
export function sessionAnswer(opened: Result<{ readonly session: Session }, HttpProblem>, next = '/'): Response {
  if (!opened.ok) return problemResponse(opened.error);
  const cookie = lucia.createSessionCookie(opened.value.session.id).serialize();
  return json({ next }, 200, { 'set-cookie': cookie });
}
