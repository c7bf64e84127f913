import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

// The tables of the sign-in library, under its own names. A test holds them against the fields it asks for.

const timestamp = (name: string) => integer(name, { mode: 'timestamp_ms' });

export const user = sqliteTable('user', {
  id: text().primaryKey(),
  name: text().notNull(),
  email: text().notNull().unique(),
  emailVerified: integer('email_verified', { mode: 'boolean' }).notNull().default(false),
  image: text(),
  createdAt: timestamp('created_at').notNull(),
  updatedAt: timestamp('updated_at').notNull(),
  role: text(),
  banned: integer({ mode: 'boolean' }).default(false),
  banReason: text('ban_reason'),
  banExpires: timestamp('ban_expires'),
});

export const session = sqliteTable('session', {
  id: text().primaryKey(),
  expiresAt: timestamp('expires_at').notNull(),
  token: text().notNull().unique(),
  createdAt: timestamp('created_at').notNull(),
  updatedAt: timestamp('updated_at').notNull(),
  ipAddress: text('ip_address'),
  userAgent: text('user_agent'),
  userId: text('user_id')
    .notNull()
    .references(() => user.id, { onDelete: 'cascade' }),
  impersonatedBy: text('impersonated_by'),
});

export const account = sqliteTable('account', {
  id: text().primaryKey(),
  accountId: text('account_id').notNull(),
  providerId: text('provider_id').notNull(),
  userId: text('user_id')
    .notNull()
    .references(() => user.id, { onDelete: 'cascade' }),
  accessToken: text('access_token'),
  refreshToken: text('refresh_token'),
  idToken: text('id_token'),
  accessTokenExpiresAt: timestamp('access_token_expires_at'),
  refreshTokenExpiresAt: timestamp('refresh_token_expires_at'),
  scope: text(),
  password: text(),
  createdAt: timestamp('created_at').notNull(),
  updatedAt: timestamp('updated_at').notNull(),
});

export const verification = sqliteTable('verification', {
  id: text().primaryKey(),
  identifier: text().notNull(),
  value: text().notNull(),
  expiresAt: timestamp('expires_at').notNull(),
  createdAt: timestamp('created_at').notNull(),
  updatedAt: timestamp('updated_at').notNull(),
});

/** Every change of state: who, what, to what. Rows are only ever added. */
export const audit = sqliteTable('audit', {
  id: integer().primaryKey({ autoIncrement: true }),
  at: timestamp('at').notNull(),
  userId: text('user_id'),
  who: text().notNull(),
  did: text().notNull(),
  subject: text().notNull(),
  subjectId: text('subject_id'),
  details: text({ mode: 'json' }).$type<Record<string, unknown>>().notNull(),
});

/** E-mails that were kept here because no mail server is configured. */
export const outbox = sqliteTable('outbox', {
  id: integer().primaryKey({ autoIncrement: true }),
  at: timestamp('at').notNull(),
  recipient: text().notNull(),
  subject: text().notNull(),
  body: text().notNull(),
});
