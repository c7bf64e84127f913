import { findUser, type SendMail } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import type { PageRow } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import type { CommentRow } from './queries.ts';

export type MailTools = { sendMail: SendMail; /** What the links begin with. */ publicUrl: string };
type Addressee = { name: string; email: string };
export type Letter = { to: Addressee; what: string; page: string; about: string; words: string; path: string };

type Occasion = {
  page: PageRow;
  thread: CommentRow;
  said: Pick<CommentRow, 'words' | 'mentions' | 'threadId'>;
  /** People who had their letter about these words before. */
  alreadyTold?: readonly string[];
};

/** Letters to those who are mentioned, and to the author of the thread when somebody else replies. Nobody writes to himself. */
export function lettersFor(db: Connection, who: SignedIn, { page, thread, said, alreadyTold }: Occasion): Letter[] {
  const manual = existingManual(db, page.manualId);
  const isFirst = alreadyTold === undefined;
  const mentioned = said.mentions.filter((id) => alreadyTold?.includes(id) !== true);
  const answered = isFirst && said.threadId !== null && !mentioned.includes(thread.authorId) ? [thread.authorId] : [];
  return [...mentioned, ...answered].flatMap((id): Letter[] => {
    const to = findUser(db, id);
    if (id === who.id || to === undefined || to.banned === true) return [];
    const quote = thread.anchor?.quote ?? '';
    return [
      {
        to,
        what: answered.includes(id) ? `${who.name} replied to you` : `${who.name} mentioned you`,
        page: `page ${page.label} of ${manual.title}`,
        about: quote === '' ? '' : `It is about these words: "${quote}"\n\n`,
        words: said.words,
        path: `/pages/${page.id}/read?comment=${thread.id}`,
      },
    ];
  });
}

/** A mail server that is down must not take the comment with it. */
export function sendLetters({ sendMail, publicUrl, log }: MailTools & Pick<Tools, 'log'>, letters: Letter[]): void {
  for (const { to, what, page, about, words, path } of letters) {
    const subject = `${what} on ${page}`;
    const text = `Dear ${to.name},\n\n${what} on ${page}:\n\n${words}\n\n${about}Read it beside the scan and answer here:\n${publicUrl}${path}\n`;
    sendMail({ to: to.email, subject, text }).catch((error: unknown) =>
      log.error({ err: error, subject }, 'a letter about a comment could not be sent'),
    );
  }
}
