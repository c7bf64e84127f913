import { desc } from 'drizzle-orm';
import nodemailer from 'nodemailer';
import { outbox } from '#server/db/schema/index.ts';
import type { Tools } from '#server/http/tools.ts';

export type Mail = { to: string; subject: string; text: string };
export type SendMail = (mail: Mail) => Promise<void>;

/** Sends through the configured mail server; without one, keeps each mail where an administrator can read it. */
export function createMailer({ config, db, now }: Pick<Tools, 'config' | 'db' | 'now'>): SendMail {
  const { smtpUrl, from } = config.mail;
  if (smtpUrl === null) {
    return ({ to, subject, text }) => {
      db.insert(outbox).values({ at: now(), recipient: to, subject, body: text }).run();
      return Promise.resolve();
    };
  }
  const transport = nodemailer.createTransport(smtpUrl);
  return async (mail) => {
    await transport.sendMail({ from, ...mail });
  };
}

export const outboxRows = ({ db }: Pick<Tools, 'db'>, limit: number, offset: number) =>
  db.select().from(outbox).orderBy(desc(outbox.id)).limit(limit).offset(offset).all();
