import { boolean, index, integer, jsonb, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import type { Role } from '../../contracts/account';
import { createdAt, id, instant } from './columns';
import { plants } from './plant';

export interface PersonSettings {
  theme?: 'light' | 'dark' | 'system';
  /** Left out: as the plant shows them. */
  units?: 'si' | 'us';
}

export const people = pgTable('people', {
  id: id(),
  email: text('email').notNull().unique(),
  name: text('name').notNull(),
  /** argon2id; null until the person has set one. */
  passwordHash: text('password_hash'),
  active: boolean('active').notNull().default(true),
  /** Theme and other choices of the person's own. */
  settings: jsonb('settings').$type<PersonSettings>().notNull().default({}),
  lastSeenAt: instant('last_seen_at'),
  createdAt: createdAt(),
});

/** A role held at one plant; a person may hold several at several plants. */
export const memberships = pgTable(
  'memberships',
  {
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    plantId: text('plant_id')
      .notNull()
      .references(() => plants.id, { onDelete: 'cascade' }),
    role: text('role').$type<Role>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.personId, t.plantId, t.role] }), index('memberships_plant').on(t.plantId)],
);

/** Lucia's sessions; the id is stored hashed. */
export const sessions = pgTable(
  'sessions',
  {
    id: id(),
    userId: text('user_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    expiresAt: instant('expires_at').notNull(),
    /** The plant that the person works at in this session. */
    plantId: text('plant_id').references(() => plants.id, { onDelete: 'set null' }),
    createdAt: createdAt(),
  },
  (t) => [index('sessions_user').on(t.userId)],
);

/** Counts tries by key (address or account) in a window. */
export const rateLimits = pgTable('rate_limits', {
  key: text('key').primaryKey(),
  count: integer('count').notNull(),
  windowEndsAt: instant('window_ends_at').notNull(),
});
