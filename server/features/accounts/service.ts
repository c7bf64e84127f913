import type { z } from 'zod';
import type { Person, invite, updatePerson } from '#shared/api/people.ts';
import { AppError } from '#shared/kit/app-error.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { record } from './audit.ts';
import type { Auth } from './auth.ts';
import { administrators, changeUser, endSessions, findUser, findUserByEmail, personOf } from './queries.ts';

type AccountTools = Pick<Tools, 'db'> & { auth: Auth };

/** Makes the account without a password and mails a link to choose one. */
export async function invitePerson(
  tools: AccountTools,
  who: SignedIn,
  wanted: z.output<typeof invite>,
): Promise<Person> {
  const { db, auth } = tools;
  if (findUserByEmail(db, wanted.email) !== undefined) {
    throw new AppError('already-exists', `${wanted.email} has an account or an invitation already.`);
  }
  const { user } = await auth.api.createUser({ body: { email: wanted.email, name: wanted.name, role: wanted.role } });
  record(db, who, { did: 'invited', subject: wanted.email, subjectId: user.id, details: { role: wanted.role } });
  await sendPasswordLink(tools, wanted.email);
  return existing(db, user.id);
}

export async function inviteAgain(tools: AccountTools, who: SignedIn, personId: string): Promise<void> {
  const person = existing(tools.db, personId);
  if (person.state !== 'invited') throw new AppError('wrong-state', `${person.email} has chosen a password already.`);
  await sendPasswordLink(tools, person.email);
  record(tools.db, who, { did: 'invited again', subject: person.email, subjectId: person.id });
}

export const sendPasswordLink = async ({ auth }: AccountTools, email: string): Promise<void> => {
  await auth.api.requestPasswordReset({ body: { email } });
};

/** Changes a role or a name, or bars somebody. The last administrator stays one, or nobody could let people in again. */
export function changePerson(
  { db }: AccountTools,
  who: SignedIn,
  { personId, change }: { personId: string; change: z.output<(typeof updatePerson)['body']> },
): Person {
  return db.transaction((tx) => {
    const before = existing(tx, personId);
    const losesAdministrator =
      before.role === 'administrator' && (change.barred === true || (change.role ?? before.role) !== 'administrator');
    if (losesAdministrator && before.state !== 'barred' && administrators(tx) < 2) {
      throw new AppError('wrong-state', 'This is the last administrator. Make somebody else one first.');
    }
    changeUser(tx, personId, {
      ...(change.role === undefined ? {} : { role: change.role }),
      ...(change.name === undefined ? {} : { name: change.name }),
      ...(change.barred === undefined ? {} : { banned: change.barred }),
    });
    if (change.barred === true) endSessions(tx, personId);
    record(tx, who, { did: 'changed a person', subject: before.email, subjectId: personId, details: { ...change } });
    return existing(tx, personId);
  });
}

function existing(db: Tools['db'], personId: string): Person {
  const row = findUser(db, personId);
  if (row === undefined) throw new AppError('not-found', 'There is no such person.');
  return personOf(db, row);
}
