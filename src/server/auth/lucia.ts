import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { Lucia, TimeSpan } from 'lucia';
import { db } from '@/db/client';
import { people, sessions, type PersonSettings } from '@/db/schema/index';
import { withHashedIds } from './hashedSessions';

interface SessionAttributes {
  readonly plantId: string | null;
  /** Of a session opened by badge. */
  readonly tabletId?: string | null;
  readonly touchedAt?: Date | null;
  readonly endsAt?: Date | null;
}

interface UserAttributes {
  readonly name: string;
  readonly active: boolean;
  readonly settings: PersonSettings;
  readonly lastSeenAt: Date | null;
}

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia;
    DatabaseSessionAttributes: SessionAttributes;
    DatabaseUserAttributes: UserAttributes;
  }
}

/** Sessions whose cookie goes over https only where the application's own address is https. */
export function createLucia(appUrl: string | undefined): Lucia<SessionAttributes, UserAttributes> {
  return new Lucia<SessionAttributes, UserAttributes>(
    withHashedIds(new DrizzlePostgreSQLAdapter(db, sessions, people)),
    {
      sessionExpiresIn: new TimeSpan(7, 'd'),
      sessionCookie: {
        name: 'steadmain_session',
        attributes: { secure: appUrl?.startsWith('https:') ?? false, sameSite: 'lax', path: '/' },
      },
      getSessionAttributes: ({ plantId, tabletId, touchedAt, endsAt }: SessionAttributes) => ({
        plantId,
        tabletId,
        touchedAt,
        endsAt,
      }),
      getUserAttributes: ({ name, active, settings, lastSeenAt }: UserAttributes) => ({
        name,
        active,
        settings,
        lastSeenAt,
      }),
    },
  );
}

export const lucia = createLucia(process.env.APP_URL);
