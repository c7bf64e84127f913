import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import type { outboxMail } from '#shared/api/outbox.ts';
import { mailsKept } from '#src/api/outbox.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';

/** Mails that were kept here instead of being sent. */
export function Outbox() {
  const { data: mails, error, isPending, refetch } = useQuery(mailsKept);
  if (isPending) return <Pending what="Fetching the mails …" lines={4} />;
  if (mails === undefined)
    return <Failure what="The outbox could not be opened" error={error} onRetry={() => void refetch()} />;
  if (mails === null) {
    return (
      <Notice kind="good" title="A mail server is configured">
        Mails are sent by it as they are written, and none is kept here.
      </Notice>
    );
  }
  if (mails.length === 0) {
    return (
      <Empty title="No mail has been written yet" action={<Button onClick={() => void refetch()}>Look again</Button>}>
        No mail server is configured, so invitations and links to new passwords are kept here for you to pass on.
      </Empty>
    );
  }
  return (
    <ul className="divide-y divide-rule border-y border-ink">
      {mails.map((mail) => (
        <Mail key={mail.id} mail={mail} />
      ))}
    </ul>
  );
}

const Mail = ({ mail: { at, to, subject, text } }: { mail: z.infer<typeof outboxMail> }) => (
  <li className="grid gap-x-6 gap-y-2 py-4 md:grid-cols-[240px_minmax(0,1fr)]">
    <div>
      <p className="break-all">{to}</p>
      <p className="text-small text-pencil">{writtenTime(at)}</p>
    </div>
    <div className="min-w-0">
      <h2 className="font-semibold">{subject}</h2>
      <p className="mt-1 max-w-[75ch] break-words whitespace-pre-wrap">
        <WithLinks text={text} />
      </p>
    </div>
  </li>
);

const address = /(https?:\/\/\S+)/;

const WithLinks = ({ text }: { text: string }) =>
  text.split(address).map((part, at) =>
    address.test(part) ? (
      <a key={at} href={part} className="word-link break-all">
        {part}
      </a>
    ) : (
      <span key={at}>{part}</span>
    ),
  );
