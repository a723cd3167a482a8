import type { SignInRequest } from '@/contracts/account';
import type { Session } from 'lucia';
import { fail, ok, type Result } from '@/core/result';
import type { HttpProblem } from '../http/problem';
import { accountByEmail, plantsOf } from '../people/people.repo';
import { lucia } from './lucia';
import { verifyPassword } from './password';
import { countTry, forgiveTry, type RateLimit } from './rateLimit';
import type { Actor } from './actor';
import { actorAt, openSession } from './session';

export interface SignInAttempt extends SignInRequest {
  readonly address: string;
  /** The session that the browser still has: it ends with a new one. */
  readonly oldSessionId: string | null;
}

export const tooMany: HttpProblem = {
  status: 429,
  code: 'SIGN-IN-TOO-MANY',
  message: 'Too many tries. Wait a quarter of an hour, then try again.',
};
const wrong: HttpProblem = {
  status: 401,
  code: 'SIGN-IN-WRONG',
  message: 'E-mail address and password do not belong together. Check both.',
};
const noPlant: HttpProblem = {
  status: 403,
  code: 'SIGN-IN-NO-PLANT',
  message: 'Your account holds no role at any plant yet. Ask your administrator.',
};

/** One person's typing, an account under attack from many places, and a whole plant behind one address. */
export function limitsOf(email: string, address: string): RateLimit[] {
  const account = email.trim().toLowerCase();
  return [
    { key: `account ${account} from ${address}`, tries: 8 },
    { key: `account ${account}`, tries: 40 },
    { key: `address ${address}`, tries: 60 },
  ];
}

/** Opens a session for e-mail address and password. Unknown, inactive and wrong are one answer in one time. */
export async function signIn(
  attempt: SignInAttempt,
): Promise<Result<{ readonly actor: Actor; readonly session: Session }, HttpProblem>> {
  const limits = limitsOf(attempt.email, attempt.address);
  if (!(await countTry(limits))) return fail(tooMany);
  const person = await accountByEmail(attempt.email);
  const matches = await verifyPassword(person?.passwordHash, attempt.password);
  if (!person || !matches || !person.active) return fail(wrong);
  await forgiveTry(limits);
  const [plant] = await plantsOf(person.id);
  if (!plant) return fail(noPlant);
  const session = await openSession(person.id, plant.plantId, attempt.oldSessionId);
  await lucia.deleteExpiredSessions();
  return ok({ actor: actorAt(person, plant), session });
}
