import { and, asc, eq, gt, isNotNull, sql } from 'drizzle-orm';
import { type Role, role } from '#shared/access/roles.ts';
import type { Person, PersonName } from '#shared/api/people.ts';
import { account, session, user } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

type UserRow = typeof user.$inferSelect;

export const hasPassword = (db: Connection, userId: string): boolean =>
  db
    .select({ id: account.id })
    .from(account)
    .where(and(eq(account.userId, userId), isNotNull(account.password)))
    .get() !== undefined;

export const personOf = (db: Connection, row: UserRow): Person => ({
  id: row.id,
  name: row.name,
  email: row.email,
  role: role.catch('reader').parse(row.role),
  state: row.banned === true ? 'barred' : hasPassword(db, row.id) ? 'active' : 'invited',
  createdAt: row.createdAt.toISOString(),
});

export const userRows = (db: Connection, limit: number, offset: number): UserRow[] =>
  db.select().from(user).orderBy(asc(user.name)).limit(limit).offset(offset).all();

/** Those who are barred get no mail, so they are left out. */
export const nameRows = (db: Connection, limit: number, offset: number): PersonName[] =>
  db
    .select({ id: user.id, name: user.name })
    .from(user)
    .where(sql`coalesce(${user.banned}, 0) = 0`)
    .orderBy(asc(user.name))
    .limit(limit)
    .offset(offset)
    .all();

export const findUser = (db: Connection, id: string): UserRow | undefined =>
  db.select().from(user).where(eq(user.id, id)).get();

export const findUserByEmail = (db: Connection, email: string): UserRow | undefined =>
  db
    .select()
    .from(user)
    .where(eq(sql`lower(${user.email})`, email.toLowerCase()))
    .get();

export const changeUser = (
  db: Connection,
  id: string,
  change: Partial<Pick<UserRow, 'role' | 'name' | 'banned'>>,
): void => {
  db.update(user)
    .set({ ...change, updatedAt: new Date() })
    .where(eq(user.id, id))
    .run();
};

export const endSessions = (db: Connection, userId: string): void => {
  db.delete(session).where(eq(session.userId, userId)).run();
};

/** The role that a session stands for at this moment; null once it has ended, or its person is barred. */
export function roleOfSession(db: Connection, sessionId: string, now: Date): Role | null {
  const row = db
    .select({ role: user.role, banned: user.banned })
    .from(session)
    .innerJoin(user, eq(user.id, session.userId))
    .where(and(eq(session.id, sessionId), gt(session.expiresAt, now)))
    .get();
  return row === undefined || row.banned === true ? null : role.catch('reader').parse(row.role);
}

export const administrators = (db: Connection): number =>
  db
    .select({ count: sql<number>`count(*)` })
    .from(user)
    .where(and(eq(user.role, 'administrator'), sql`coalesce(${user.banned}, 0) = 0`))
    .get()?.count ?? 0;

export const hasUsers = (db: Connection): boolean => db.select({ id: user.id }).from(user).limit(1).get() !== undefined;

/** The demo's people all have addresses under one name that nobody can own (RFC 2606). */
export const hasDemoPeople = (db: Connection): boolean => findUserByEmail(db, 'reader@benchleaf.example') !== undefined;
