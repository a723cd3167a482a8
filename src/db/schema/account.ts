import { boolean, index, integer, jsonb, pgTable, primaryKey, text, unique } from 'drizzle-orm/pg-core';
import type { Role } from '../../contracts/account';
import { createdAt, id, instant } from './columns';
import { mails } from './mail';
import { lines, plants } from './plant';

export interface PersonSettings {
  theme?: 'light' | 'dark' | 'system';
  /** Left out: as the plant shows them. */
  units?: 'si' | 'us';
  /** What the person wants to be told of by e-mail; left out: everything that is meant for the role. */
  notices?: { issue?: boolean };
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
    /** Lines that the person works on, the same for every role at the plant; null: all. */
    lineIds: jsonb('line_ids').$type<string[]>(),
    /** The person may not work at the plant since; null: may. */
    inactiveAt: instant('inactive_at'),
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
    /** Of a session opened by badge: the tablet that it holds on, its last touch and its end at the latest. */
    tabletId: text('tablet_id').references(() => tablets.id, { onDelete: 'cascade' }),
    touchedAt: instant('touched_at'),
    endsAt: instant('ends_at'),
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

/** Somebody asked to join a plant. The link's token is stored hashed. */
export const invitations = pgTable(
  'invitations',
  {
    id: id(),
    plantId: text('plant_id')
      .notNull()
      .references(() => plants.id, { onDelete: 'cascade' }),
    /** In lower case. */
    email: text('email').notNull(),
    roles: jsonb('roles').$type<Role[]>().notNull(),
    lineIds: jsonb('line_ids').$type<string[]>(),
    tokenHash: text('token_hash').notNull().unique(),
    expiresAt: instant('expires_at').notNull(),
    /** The message that carries the newest link. */
    mailId: text('mail_id').references(() => mails.id, { onDelete: 'set null' }),
    invitedBy: text('invited_by').notNull(),
    acceptedAt: instant('accepted_at'),
    acceptedBy: text('accepted_by'),
    withdrawnAt: instant('withdrawn_at'),
    createdAt: createdAt(),
  },
  (t) => [index('invitations_plant').on(t.plantId)],
);

/** A forgotten password's link; its token is stored hashed and works once. */
export const passwordResets = pgTable(
  'password_resets',
  {
    tokenHash: text('token_hash').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    expiresAt: instant('expires_at').notNull(),
    usedAt: instant('used_at'),
    createdAt: createdAt(),
  },
  (t) => [index('password_resets_person').on(t.personId)],
);

/** A device on the floor that signs people in by badge. The token in its cookie is stored hashed. */
export const tablets = pgTable(
  'tablets',
  {
    id: id(),
    plantId: text('plant_id')
      .notNull()
      .references(() => plants.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    /** The line that it hangs at; null: none in particular. */
    lineId: text('line_id').references(() => lines.id),
    tokenHash: text('token_hash').notNull().unique(),
    enrolledBy: text('enrolled_by').notNull(),
    lastSeenAt: instant('last_seen_at'),
    revokedAt: instant('revoked_at'),
    createdAt: createdAt(),
  },
  (t) => [index('tablets_plant').on(t.plantId)],
);

/** What a person types at a tablet of one plant: the badge's number and a PIN, stored as argon2id. */
export const badges = pgTable(
  'badges',
  {
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    plantId: text('plant_id')
      .notNull()
      .references(() => plants.id, { onDelete: 'cascade' }),
    number: text('number').notNull(),
    pinHash: text('pin_hash').notNull(),
    changedAt: instant('changed_at').notNull(),
  },
  (t) => [primaryKey({ columns: [t.personId, t.plantId] }), unique('badges_number').on(t.plantId, t.number)],
);

/** The code that makes the first administrator of an empty installation; stored hashed, there is one at most. */
export const firstRunCodes = pgTable('first_run_codes', {
  codeHash: text('code_hash').primaryKey(),
  createdAt: createdAt(),
});
