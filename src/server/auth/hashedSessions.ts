import { createHash } from 'node:crypto';
import type { Adapter, DatabaseSession } from 'lucia';

/** What is stored for a session: who reads the table cannot take a session over. */
export const hashSessionId = (sessionId: string): string => createHash('sha256').update(sessionId).digest('hex');

/** The same store, keyed by hashes; callers keep working with the cookie's ids. */
export function withHashedIds(inner: Adapter): Adapter {
  return {
    async getSessionAndUser(sessionId) {
      const [session, user] = await inner.getSessionAndUser(hashSessionId(sessionId));
      return [session && { ...session, id: sessionId }, user];
    },
    // The cookie's ids can't be had back from the store: these carry the stored ones.
    getUserSessions: (userId) => inner.getUserSessions(userId),
    setSession: (session: DatabaseSession) => inner.setSession({ ...session, id: hashSessionId(session.id) }),
    updateSessionExpiration: (id, expiresAt) => inner.updateSessionExpiration(hashSessionId(id), expiresAt),
    deleteSession: (id) => inner.deleteSession(hashSessionId(id)),
    deleteUserSessions: (userId) => inner.deleteUserSessions(userId),
    deleteExpiredSessions: () => inner.deleteExpiredSessions(),
  };
}
