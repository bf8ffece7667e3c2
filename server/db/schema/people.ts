import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  varchar,
} from 'drizzle-orm/mysql-core';

import { ROLES } from '#shared/domain/roles.ts';
import { document, id, instant, instantNow, reference } from '../columns.ts';

export const people = mysqlTable(
  'people',
  {
    id: id(),
    /** Lower case; the same address signs in only one person. */
    email: varchar({ length: 254 }).notNull().unique(),
    name: varchar({ length: 120 }).notNull(),
    /** argon2id in PHC notation; null until the person has chosen a password. */
    passwordHash: varchar({ length: 255 }),
    active: boolean().notNull().default(true),
    version: int().notNull().default(1),
    lastSeenAt: instant(),
    createdAt: instantNow(),
    updatedAt: instantNow(),
  },
  (table) => [
    index('people_name').on(table.name),
    check('people_email_lower', sql`binary email = binary lower(email)`),
  ],
);

export const personRoles = mysqlTable(
  'person_roles',
  {
    personId: reference()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    role: mysqlEnum(ROLES).notNull(),
    grantedById: reference().references(() => people.id),
    grantedAt: instantNow(),
  },
  (table) => [
    primaryKey({ name: 'person_roles_key', columns: [table.personId, table.role] }),
    index('person_roles_role').on(table.role),
  ],
);

/** Links sent by mail; only the hash of the token is kept. */
export const oneTimeTokens = mysqlTable(
  'one_time_tokens',
  {
    id: id(),
    personId: reference()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    purpose: mysqlEnum(['invitation', 'passwordReset']).notNull(),
    tokenHash: varchar({ length: 64 }).notNull().unique(),
    expiresAt: instant().notNull(),
    usedAt: instant(),
    createdAt: instantNow(),
  },
  (table) => [index('one_time_tokens_expires').on(table.expiresAt)],
);

export const sessions = mysqlTable(
  'sessions',
  {
    /** Hash of the session's id, so that a copy of the table signs nobody in. */
    sid: varchar({ length: 64 }).primaryKey(),
    data: document<Record<string, unknown>>().notNull(),
    expiresAt: instant().notNull(),
    personId: reference().references(() => people.id, { onDelete: 'cascade' }),
  },
  (table) => [index('sessions_expires').on(table.expiresAt), index('sessions_person').on(table.personId)],
);

/** Tries to sign in that did not succeed (or are still being checked), by account and by address. */
export const signInAttempts = mysqlTable(
  'sign_in_attempts',
  {
    id: id(),
    kind: mysqlEnum(['account', 'address']).notNull(),
    /** Hash of the e-mail address or of the network address. */
    subject: varchar({ length: 64 }).notNull(),
    at: instant().notNull(),
  },
  (table) => [
    index('sign_in_attempts_subject').on(table.kind, table.subject, table.at),
    index('sign_in_attempts_at').on(table.at),
  ],
);
