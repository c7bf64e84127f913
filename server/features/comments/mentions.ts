import { findUser } from '#server/features/accounts/index.ts';
import type { Connection } from '#server/jobs/events.ts';

/** Of the people named by the sender, those who can sign in and whom the words call by @ and their name. */
export const mentionedIn = (db: Connection, words: string, ids: readonly string[]): string[] =>
  [...new Set(ids)].filter((id) => {
    const person = findUser(db, id);
    return person !== undefined && person.banned !== true && words.includes(`@${person.name}`);
  });
