import { desc, eq } from 'drizzle-orm';
import { db } from '@/db/client';
import { mails } from '@/db/schema/index';
import { lucia } from '@/server/auth/lucia';

/** The session's id in an answer's cookie; empty without one. */
export const sessionIn = (response: Response): string =>
  lucia.readSessionCookie(response.headers.get('set-cookie') ?? '') ?? '';

/** The newest message queued for an address. */
export async function mailTo(address: string) {
  const [mail] = await db
    .select()
    .from(mails)
    .where(eq(mails.to, address))
    .orderBy(desc(mails.createdAt), desc(mails.id))
    .limit(1);
  return mail ?? null;
}

/** The token of the link in the newest message to an address. */
export async function tokenTo(address: string): Promise<string> {
  const mail = await mailTo(address);
  const token = /\/(?:invitation|reset)\/([\w-]+)/.exec(mail?.text ?? '')?.[1];
  if (!token) throw new Error(`no link was sent to ${address}`);
  return token;
}
